import { plural } from '$lib/format';
import { action, getShop, page } from '$lib/server/people';
import { pricedEngines } from '$lib/server/prices';
import { addWant } from '$lib/server/wants';
import { ofForm, WantForm } from '$lib/wants/input';
import { kindOptions } from '$lib/wants/kind-options';
import type { PageServerLoadEvent, RequestEvent } from './$types';
import { asksFrom, knownFirst } from './start';

export const load = page('trade', async (ctx, { url, params }: PageServerLoadEvent) => {
	const { known, chosen } = await knownFirst(ctx, url.searchParams);
	return {
		start: await asksFrom(ctx, url.searchParams),
		known: known.map(({ id, name, phone, email }) => ({ id, name, phone, email })),
		chosen,
		kinds: kindOptions,
		engines: await pricedEngines(ctx),
		back: { href: `/${params.shop}/wants`, label: 'Wants' }
	};
});

export const actions = {
	default: action('trade', WantForm, async (ctx, typed, { params }: RequestEvent) => {
		const { currency } = await getShop(ctx);
		const { number, matches } = await addWant(ctx, ofForm(typed, currency));
		const here = matches > 0 ? `: ${plural(matches, 'answer', 'answers')} here already` : '';
		const done = encodeURIComponent(`W${number} is on the list${here}`);
		return { to: `/${params.shop}/wants/W${number}?done=${done}` };
	})
};
