import { bothWays, type LengthUnit } from '$lib/units';

/** A length both ways, the unit that the shop shows first in front. */
export function length(mm: number, shownFirst: LengthUnit): string {
	return bothWays(mm, shownFirst);
}

/** Grams to read: grams under a kilogram, else kilograms with one decimal. */
export function mass(grams: number, locale = 'en-US'): string {
	const kilos = Math.round(grams) >= 1000;
	return new Intl.NumberFormat(locale, {
		style: 'unit',
		unit: kilos ? 'kilogram' : 'gram',
		maximumFractionDigits: kilos ? 1 : 0
	}).format(kilos ? grams / 1000 : grams);
}
