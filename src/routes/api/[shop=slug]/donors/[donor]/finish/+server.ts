import { finishDonor, getDonor } from '$lib/server/donors';
import { change } from '$lib/server/people';
import { finishStripping } from '$lib/server/yard';
import { Finish, FinishCall } from '$lib/yard/input';
import type { RequestEvent } from './$types';

export const POST = change('work', FinishCall, async (ctx, input, { params }: RequestEvent) => {
	if (input.grams) await finishStripping(ctx, params.donor, Finish.parse(input));
	else await finishDonor(ctx, params.donor, input);
	return { body: await getDonor(ctx, params.donor) };
});
