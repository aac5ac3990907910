import { ReleaseInput } from '$lib/donors/input';
import { getDonor, releaseDonor } from '$lib/server/donors';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', ReleaseInput, async (ctx, input, { params }: RequestEvent) => {
	await releaseDonor(ctx, params.donor, input);
	return { body: await getDonor(ctx, params.donor) };
});
