import { Move } from '$lib/parts/input';
import { getPart, movePart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Move, async (ctx, input, { params }: RequestEvent) => {
	await movePart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
