import { inCents, typedAmount } from '$lib/people/typed-money';
import { z } from 'zod';
import { CHOICE_FIELDS, type ChoiceField } from './choice-fields';
import type { GivenFigures } from './choices-view';

const SHARE = 'Enter the chance as a number from 0 to 1';
const CENTS = 'Enter the amount in whole cents, from 0 to 100000000';
const MINUTES = 'Enter the minutes as a number from 0 to 10000';
const share = z.coerce.number(SHARE).min(0, SHARE).max(1, SHARE);
const cents = z.coerce.number(CENTS).int(CENTS).min(0, CENTS).max(100_000_000, CENTS);

/** The figures of a decision as a script gives them: cents, chances of 0 to 1. */
export const ChoiceFigures = z
	.object({
		fixChance: share,
		fixedPriceCents: cents,
		newPartsCents: cents,
		labourCents: cents,
		wholePriceCents: cents
	})
	.partial();

export const PlanQuestion = z.object({
	minutes: z.coerce.number(MINUTES).min(0, MINUTES).max(10_000, MINUTES).optional()
});

const MOST = 1_000_000;

function figureOf({ label, unit }: ChoiceField, typed: string, currency: string): number | string {
	const amount = typedAmount(typed.replace('%', ''));
	if (unit === 'per cent')
		return amount !== null && amount <= 100
			? amount / 100
			: `Enter “${label}” as a per cent from 0 to 100`;
	return amount !== null && amount <= MOST
		? inCents(amount, currency)
		: `Enter “${label}” as an amount, like 46 or 46.50`;
}

/** What was typed into the address of the page: the figures, and what to say about the others. */
export function typedFigures(asked: URLSearchParams, currency: string) {
	const given: GivenFigures = {};
	const problems: { field: string; message: string }[] = [];
	for (const each of CHOICE_FIELDS) {
		const typed = asked.get(each.field)?.trim();
		if (!typed) continue;
		const figure = figureOf(each, typed, currency);
		if (typeof figure === 'number') given[each.name] = figure;
		else problems.push({ field: each.field, message: figure });
	}
	return { given, problems };
}

/** Minutes at hand out of the address of a page; none is no limit. */
export function minutesIn(asked: URLSearchParams): number | null {
	const minutes = Number(asked.get('minutes') || NaN);
	return minutes >= 0 && minutes <= 10_000 ? minutes : null;
}
