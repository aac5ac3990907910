import { PutBackInput } from '$lib/prices/input';
import { isPriceSort } from '$lib/prices/view';
import { action, page } from '$lib/server/people';
import { listPrices, listRemoved, putBackPrice } from '$lib/server/prices';
import { isKindId } from '$lib/trade';

export const load = page('see', async (ctx, { url, params }) => {
	const ask = (name: string) => url.searchParams.get(name) ?? '';
	const sort = ask('sort');
	const filter = {
		q: ask('q'),
		kind: isKindId(ask('kind')) ? ask('kind') : '',
		stale: ask('stale') === 'yes',
		sort: isPriceSort(sort) ? sort : ('kind' as const),
		down: ask('down') === 'yes'
	};
	const found = await listPrices(ctx, { ...filter, cursor: ask('cursor') });
	return {
		...found,
		filter,
		laterPage: ask('cursor') !== '',
		removed: await listRemoved(ctx),
		justRemoved: Number(ask('removed')),
		wide: true,
		home: `/${params.shop}/prices`
	};
});

export const actions = {
	back: action('trade', PutBackInput, async (ctx, { event }) => {
		const { kindName } = await putBackPrice(ctx, event);
		return { to: `?done=${encodeURIComponent(`Put back: ${kindName}`)}` };
	})
};
