import { Nothing } from '$lib/parts/input';
import { getPart, foundPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await foundPart(ctx, params.part);
	return { body: await getPart(ctx, params.part) };
});
