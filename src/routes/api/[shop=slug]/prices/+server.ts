import { PriceInput } from '$lib/prices/input';
import { isPriceSort } from '$lib/prices/view';
import { change, read } from '$lib/server/people';
import { listPrices, putPrice } from '$lib/server/prices';

export const GET = read('see', (ctx, { url }) => {
	const ask = (name: string) => url.searchParams.get(name) ?? undefined;
	const sort = ask('sort') ?? null;
	return listPrices(ctx, {
		q: ask('q'),
		kind: ask('kind'),
		stale: ask('stale') === 'yes',
		sort: isPriceSort(sort) ? sort : undefined,
		down: ask('down') === 'yes',
		limit: Number(ask('limit')) || undefined,
		cursor: ask('cursor')
	});
});

export const PUT = change('trade', PriceInput, async (ctx, input) => ({ body: await putPrice(ctx, input) }));
