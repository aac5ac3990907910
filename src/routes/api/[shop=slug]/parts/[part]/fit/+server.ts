import { Fit } from '$lib/parts/input';
import { getPart, fitPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('hold', Fit, async (ctx, input, { params }: RequestEvent) => {
	await fitPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
