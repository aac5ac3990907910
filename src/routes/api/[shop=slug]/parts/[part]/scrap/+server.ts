import { Scrap } from '$lib/parts/input';
import { getPart, scrapPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Scrap, async (ctx, input, { params }: RequestEvent) => {
	await scrapPart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
