import { typedAmount, inCents } from '$lib/people/typed-money';
import { Refused } from '$lib/refusal';
import { SCRAP_CLASSES } from '$lib/trade';
import { ScrapRun } from '$lib/yard/input';
import { z } from 'zod';

/** Two fields for each class: kilos-Al-Fe and money-Al-Fe. */
const fields = Object.fromEntries(
	SCRAP_CLASSES.flatMap(({ id }) => [
		[`kilos-${id}`, z.string().trim().optional()],
		[`money-${id}`, z.string().trim().optional()]
	])
);

export const RunForm = ScrapRun.omit({ loads: true }).extend({
	...fields,
	file: z.unknown().optional()
});
export type RunForm = z.infer<typeof RunForm> & Record<string, unknown>;

/** What was typed for each class, in grams and cents. */
export function loadsOf(typed: Record<string, unknown>, currency: string): ScrapRun['loads'] {
	return SCRAP_CLASSES.flatMap(({ id, said }) => {
		const [kilos, money] = [String(typed[`kilos-${id}`] ?? ''), String(typed[`money-${id}`] ?? '')];
		if (!kilos && !money) return [];
		const weight = /^\d{1,5}([.,]\d{1,3})?$/.test(kilos) ? Number(kilos.replace(',', '.')) : 0;
		if (weight <= 0)
			throw new Refused('bad input', `Enter the kilograms of ${said}, like 21.5.`, `kilos-${id}`);
		const amount = money === '' ? 0 : typedAmount(money);
		if (amount === null)
			throw new Refused('bad input', `Enter what ${said} brought, like 8.20.`, `money-${id}`);
		return [{ scrapClass: id, grams: Math.round(weight * 1000), cents: inCents(amount, currency) }];
	});
}
