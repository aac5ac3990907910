import { BinAgain } from '$lib/bins/input';
import { drawRacks } from '$lib/bins/rack';
import { isShade, shading, type Shade } from '$lib/bins/shade';
import { listBins, listRetiredBins, useBinAgain } from '$lib/server/bins';
import { action, page } from '$lib/server/people';
import { daysInBins, moneyInBins } from '$lib/server/walks';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const known = (by: Shade, ctx: Parameters<typeof moneyInBins>[0]) =>
	by === 'money' ? moneyInBins(ctx) : by === 'age' ? daysInBins(ctx) : new Map<number, number>();

export const load = page('see', async (ctx, { url }: PageServerLoadEvent) => {
	const asked = url.searchParams.get('shade');
	const by: Shade = isShade(asked) ? asked : 'fullness';
	const bins = await listBins(ctx);
	const shade = { by, ...shading(bins, by, await known(by, ctx)) };
	return { bins, ...drawRacks(bins), shade, retired: await listRetiredBins(ctx), wide: true };
});

export const actions = {
	again: action('work', BinAgain, async (ctx, { tag }, { params }: RequestEvent) => {
		const { address } = await useBinAgain(ctx, tag);
		return { to: `/${params.shop}/bins?done=${encodeURIComponent(`${address} is in use again`)}` };
	})
};
