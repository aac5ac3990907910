import { page } from '$lib/server/people';
import { countWants, listWants, SHOWN, type Shown } from '$lib/server/wants';
import type { PageServerLoadEvent } from './$types';

const isShown = (word: string | null): word is Shown => SHOWN.includes(word as Shown);

export const load = page('trade', async (ctx, { url }: PageServerLoadEvent) => {
	const word = url.searchParams.get('show');
	const shown = isShown(word) ? word : 'open';
	const cursor = url.searchParams.get('cursor') ?? undefined;
	const counts = await countWants(ctx);
	return { shown, counts, ...(await listWants(ctx, { shown, cursor })) };
});
