import { Clean } from '$lib/parts/input';
import { cleanPart, getPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Clean, async (ctx, input, { params }: RequestEvent) => {
	await cleanPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
