import { money } from '$lib/format';
import { ownPath } from '$lib/people/own-path';
import { oddPrice } from '$lib/prices/band';
import { ofForm, PriceForm } from '$lib/prices/input';
import { action, getShop, page } from '$lib/server/people';
import { findPrice, pricedEngines, putPrice } from '$lib/server/prices';

export const load = page('trade', async (ctx, { url, params }) => {
	const ask = (name: string) => url.searchParams.get(name) ?? '';
	const asked = { kind: ask('kind'), engine: ask('engine'), number: ask('number') };
	const known = await findPrice(ctx, asked);
	return {
		start: known ? { ...known, seenOn: undefined } : asked,
		goBack: ask('back'),
		engines: await pricedEngines(ctx),
		today: ctx.now.toISOString().slice(0, 10),
		back: { href: `/${params.shop}/prices`, label: 'Prices' }
	};
});

export const actions = {
	default: action('trade', PriceForm, async (ctx, typed, { params }) => {
		const { currency } = await getShop(ctx);
		const saved = await putPrice(ctx, ofForm(typed, currency));
		const odd = oddPrice(saved, (cents) => money(cents, currency));
		const done = encodeURIComponent(odd ? `Saved. ${odd}` : `Saved: ${saved.kindName}`);
		const to = typed.back ? ownPath(typed.back) : `/${params.shop}/prices`;
		return { to: `${to}${to.includes('?') ? '&' : '?'}done=${done}` };
	})
};
