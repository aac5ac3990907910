import { BinAgain } from '$lib/bins/input';
import { drawRacks } from '$lib/bins/rack';
import { listBins, listRetiredBins, useBinAgain } from '$lib/server/bins';
import { action, page } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const load = page('see', async (ctx) => {
	const bins = await listBins(ctx);
	return { bins, ...drawRacks(bins), retired: await listRetiredBins(ctx), wide: true };
});

export const actions = {
	again: action('work', BinAgain, async (ctx, { tag }, { params }: RequestEvent) => {
		const { address } = await useBinAgain(ctx, tag);
		return { to: `/${params.shop}/bins?done=${encodeURIComponent(`${address} is in use again`)}` };
	})
};
