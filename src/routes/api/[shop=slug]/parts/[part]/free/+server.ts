import { Nothing } from '$lib/parts/input';
import { getPart, freePart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('hold', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await freePart(ctx, params.part);
	return { body: await getPart(ctx, params.part) };
});
