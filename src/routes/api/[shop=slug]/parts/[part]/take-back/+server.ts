import { TakeBack } from '$lib/parts/input';
import { getPart, takeBackPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('trade', TakeBack, async (ctx, input, { params }: RequestEvent) => {
	await takeBackPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
