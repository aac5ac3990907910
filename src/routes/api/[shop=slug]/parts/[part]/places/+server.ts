import { binsFor, getPart } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', async (ctx, { params }) => {
	const { kind, massGrams } = await getPart(ctx, params.part);
	return { items: await binsFor(ctx, kind, massGrams) };
});
