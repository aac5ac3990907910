import { Hold } from '$lib/parts/input';
import { getPart, holdPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('hold', Hold, async (ctx, input, { params }: RequestEvent) => {
	await holdPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
