import { Proof } from '$lib/parts/input';
import { getPart, provePart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Proof, async (ctx, input, { params }: RequestEvent) => {
	await provePart(ctx, params.part, input);
	return { body: await getPart(ctx, params.part) };
});
