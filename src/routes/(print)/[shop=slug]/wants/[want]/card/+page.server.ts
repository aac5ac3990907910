import { NotFound } from '$lib/refusal';
import { getShop, page } from '$lib/server/people';
import { draftFor, getWant } from '$lib/server/wants';
import type { PageServerLoadEvent } from './$types';

export const load = page('trade', async (ctx, { params }: PageServerLoadEvent) => {
	const draft = await draftFor(ctx, params.want);
	if (!draft) throw new NotFound('Nothing is here to tell of. Go back to the want.');
	const { name, slug } = await getShop(ctx);
	const { number } = await getWant(ctx, params.want);
	return { name, slug, number, ...draft };
});
