import { Pull } from '$lib/parts/input';
import { getPart, pullPart } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Pull, async (ctx, input, { params }: RequestEvent) => {
	const { tag } = await pullPart(ctx, params.donor, input);
	return { status: 201, body: await getPart(ctx, tag) };
});
