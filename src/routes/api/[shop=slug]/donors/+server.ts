import { TakeIn } from '$lib/donors/input';
import { DonorFilter } from '$lib/donors/filter';
import { getDonor, listDonors, takeIn } from '$lib/server/donors';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', (ctx, { url }) =>
	listDonors(ctx, DonorFilter.parse(Object.fromEntries(url.searchParams)))
);

export const POST = change('work', TakeIn, async (ctx, input) => {
	const { number } = await takeIn(ctx, input);
	return { status: 201, body: await getDonor(ctx, number) };
});
