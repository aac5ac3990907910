import { currencies, ShopEdit, timeZones } from '$lib/people/input';
import { action, editShop, page } from '$lib/server/people';

export const load = page('run', (_ctx, { params }) => ({
	currencies: currencies(),
	timeZones: timeZones(),
	back: { href: `/${params.shop}/people`, label: 'More' }
}));

export const actions = {
	default: action('run', ShopEdit, async (ctx, input) => {
		await editShop(ctx, input);
		return { to: '?done=Settings saved' };
	})
};
