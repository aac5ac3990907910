import { Here } from '$lib/walks/input';
import { change } from '$lib/server/people';
import { putStrayRight } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const POST = change('work', Here, async (ctx, input, { params }: RequestEvent) => ({
	body: await putStrayRight(ctx, Number(params.walk), input)
}));
