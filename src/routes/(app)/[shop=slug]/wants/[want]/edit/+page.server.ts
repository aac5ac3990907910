import { action, getShop, page } from '$lib/server/people';
import { pricedEngines } from '$lib/server/prices';
import { editWant, getWant } from '$lib/server/wants';
import { ofEditForm, WantEditForm } from '$lib/wants/input';
import { kindOptions } from '$lib/wants/kind-options';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('trade', async (ctx, { params }: PageServerLoadEvent) => {
	const want = await getWant(ctx, params.want);
	return {
		want,
		kinds: kindOptions,
		engines: await pricedEngines(ctx),
		back: { href: `/${params.shop}/wants/W${want.number}`, label: `W${want.number}` },
		short: `W${want.number}`
	};
});

export const actions = {
	default: action('trade', WantEditForm, async (ctx, typed, { params }: RequestEvent) => {
		const { currency } = await getShop(ctx);
		const { number } = await editWant(ctx, params.want, ofEditForm(typed, currency));
		return { to: `/${params.shop}/wants/W${number}?done=Saved` };
	})
};
