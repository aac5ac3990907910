import { getPart } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', async (ctx, { params }: RequestEvent) => {
	const { worth } = await getPart(ctx, params.part);
	const sources = [...new Set(worth?.terms.map(({ source }) => source).filter(Boolean))];
	return { ...worth, sources };
});
