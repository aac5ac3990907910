import { DonorEdit } from '$lib/donors/input';
import { editDonor, getDonor } from '$lib/server/donors';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', (ctx, { params }: RequestEvent) => getDonor(ctx, params.donor));

export const PATCH = change('work', DonorEdit, async (ctx, input, { params }: RequestEvent) => {
	await editDonor(ctx, params.donor, input);
	return { body: await getDonor(ctx, params.donor) };
});
