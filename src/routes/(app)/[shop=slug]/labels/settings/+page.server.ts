import { ResetForm, StockForm, WhoseForm } from '$lib/labels/settings-form';
import { stockHere } from '$lib/labels/stock-here';
import { isStockId, stockOf, STOCKS } from '$lib/labels/stocks';
import { getLabelSettings, resetStock, saveStock, sayWhose } from '$lib/server/labels';
import { action, page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('see', async (ctx, { url, params, cookies }: PageServerLoadEvent) => {
	const asked = url.searchParams.get('stock') ?? '';
	const id = isStockId(asked) ? asked : stockHere({}, cookies);
	const { stocks, saysOwner, version } = await getLabelSettings(ctx);
	return {
		stock: stockOf(id, stocks),
		isOwn: stocks[id] !== undefined,
		all: STOCKS.map(({ id, said }) => ({ id, said })),
		saysOwner,
		version,
		back: { href: `/${params.shop}/labels`, label: 'Labels' }
	};
});

export const actions = {
	save: action('work', StockForm, async (ctx, input) => {
		await saveStock(ctx, input);
		return { to: `?stock=${input.stock}&done=${encodeURIComponent('Measures saved')}` };
	}),
	reset: action('work', ResetForm, async (ctx, { stock }) => {
		await resetStock(ctx, stock);
		return { to: `?stock=${stock}&done=${encodeURIComponent('As they are sold again')}` };
	}),
	whose: action('run', WhoseForm, async (ctx, { whose }) => {
		await sayWhose(ctx, whose === 'yes');
		return { to: `?done=${encodeURIComponent('Saved')}` };
	})
};
