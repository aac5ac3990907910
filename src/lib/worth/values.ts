import type { GainFigures } from './gain-input';
import { openWant, reach } from './waiting';

/** The terms of a gain, in cents and unrounded, except `reach` (a chance). */
export interface Terms {
	sale: number;
	reach: number;
	shelf: number | null;
	shelfCost: number;
	whenCalled: number;
	now: number;
	scrap: number;
}

/** What one answered call is worth when the part is good, in cents. */
export function sale(part: GainFigures): number {
	return (1 - part.comeBack) * part.usedCents - part.comeBack * part.comeBackCents - part.kitCents;
}

/** Shelf for ever, less scrapping it when it dies out; null where neither money nor time wears. */
export function shelfForEver(part: GainFigures): number | null {
	const theta = part.moneyRate + part.dyingRate;
	if (theta === 0) return null;
	return (part.shelfCents - part.scrapCents * part.dyingRate) / theta;
}

/**
 * Scrap and shelf for ever together, said so that rounding cannot take it below nil. Only where
 * money or time wears.
 */
export function holding(part: GainFigures): number {
	const theta = part.moneyRate + part.dyingRate;
	return (part.shelfCents + part.scrapCents * part.moneyRate) / theta;
}

/** The shelf term until its call; with no wear it is the limit, shelf cost x the expected wait. */
export function shelfCost(part: GainFigures): number {
	const forEver = shelfForEver(part);
	if (forEver !== null) return forEver * (1 - reach(part));
	return ((1 - openWant(part)) * part.shelfCents * part.place) / part.callsPerYear;
}

/** The two values of keeping, work when called and work now, with what they are made of. */
export function termsOf(part: GainFigures): Terms {
	const good = part.chanceGood;
	const sold = sale(part);
	const reached = reach(part);
	const shelved = shelfCost(part);
	const scrap = part.scrapCents;
	const later = part.labour * part.minutesLater;
	const answered = good * sold + (1 - good) * scrap - later;
	return {
		sale: sold,
		reach: reached,
		shelf: shelfForEver(part),
		shelfCost: shelved,
		whenCalled: reached * answered - shelved - part.labourNow * part.minutesNow,
		now:
			good * (reached * sold - shelved) +
			(1 - good) * scrap -
			part.labourNow * (part.minutesNow + part.minutesLater),
		scrap
	};
}

/** When the work is best done: when called wherever it must be, or where that is no worse. */
export function bestTiming(part: GainFigures, terms: Terms): 'when-called' | 'now' {
	return part.workWhenCalledOnly || terms.whenCalled >= terms.now ? 'when-called' : 'now';
}

/** What keeping is worth against scrapping it now, in cents, unrounded: the better of the two. */
export function bestGain(part: GainFigures, terms = termsOf(part)): number {
	const best = bestTiming(part, terms) === 'now' ? terms.now : terms.whenCalled;
	return best - terms.scrap;
}
