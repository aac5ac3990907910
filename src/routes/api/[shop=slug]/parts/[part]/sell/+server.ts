import { Sell } from '$lib/parts/input';
import { getPart, sellPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('trade', Sell, async (ctx, input, { params }: RequestEvent) => {
	await sellPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
