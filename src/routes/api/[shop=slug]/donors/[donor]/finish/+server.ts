import { MoveInput } from '$lib/donors/input';
import { getDonor, finishDonor } from '$lib/server/donors';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', MoveInput, async (ctx, input, { params }: RequestEvent) => {
	await finishDonor(ctx, params.donor, input);
	return { body: await getDonor(ctx, params.donor) };
});
