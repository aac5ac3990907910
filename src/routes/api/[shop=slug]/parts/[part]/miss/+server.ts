import { Nothing } from '$lib/parts/input';
import { getPart, missPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await missPart(ctx, params.part);
	return { body: await getPart(ctx, params.part) };
});
