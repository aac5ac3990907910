import { SellForm } from '$lib/parts/form';
import { Fit } from '$lib/parts/input';
import { canSell } from '$lib/parts/state';
import { centsTyped, inCents } from '$lib/people/typed-money';
import { fitPart, recentFor, sellPart } from '$lib/server/parts';
import { action, getShop, page } from '$lib/server/people';
import { kind } from '$lib/trade';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('hold', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'fit');
	const { currency } = await getShop(ctx);
	const { worth, grade } = sheet.part;
	// Untested it goes out as untested, never at the price of a tested one.
	const asked =
		grade === 'untested' && worth?.untestedCents != null ? worth.untestedCents : worth?.askedCents;
	return {
		...sheet,
		recent: await recentFor(ctx),
		sellShut: canSell(sheet.part),
		tradeOnly: kind(sheet.part.kind).reuse === 'safety-trade',
		asked: centsTyped(asked, currency)
	};
});

export const actions = {
	fit: action('hold', Fit, async (ctx, input, event: RequestEvent) =>
		after(event, await fitPart(ctx, event.params.tag, input), `Fitted on ${input.job}`)
	),
	sell: action('trade', SellForm, async (ctx, { price, to }, event: RequestEvent) => {
		const cents = inCents(price, (await getShop(ctx)).currency);
		const done = await sellPart(ctx, event.params.tag, { cents, to });
		return after(event, done, to ? `Sold to ${to}` : 'Sold');
	})
};
