import { money } from '$lib/format';
import { oddPrice } from '$lib/prices/band';
import { ofForm, PriceForm, RemoveInput } from '$lib/prices/input';
import { action, getShop, page } from '$lib/server/people';
import { editPrice, getPrice, pricedEngines, removePrice } from '$lib/server/prices';

export const load = page('trade', async (ctx, { params }) => {
	const { currency } = await getShop(ctx);
	const price = await getPrice(ctx, Number(params.price));
	return {
		price,
		odd: oddPrice(price, (cents) => money(cents, currency)),
		engines: await pricedEngines(ctx),
		today: ctx.now.toISOString().slice(0, 10),
		back: { href: `/${params.shop}/prices`, label: 'Prices' }
	};
});

export const actions = {
	save: action('trade', PriceForm, async (ctx, typed, { params }) => {
		const { currency } = await getShop(ctx);
		await editPrice(ctx, Number(params.price), ofForm(typed, currency));
		return { to: '?done=Saved' };
	}),
	remove: action('trade', RemoveInput, async (ctx, { version }, { params }) => {
		const event = await removePrice(ctx, Number(params.price), version);
		return { to: `/${params.shop}/prices?done=Removed&removed=${event}` };
	})
};
