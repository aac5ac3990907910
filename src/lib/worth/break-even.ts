import type { GainFigures } from './gain-input';
import { holding, shelfCost, shelfForEver } from './values';
import { reach } from './waiting';

export interface BreakEven {
	whenCalled: number;
	now: number;
}

// (scrap + work + shelf term) / reach, with the parts of the shelf term that cancel left out
function mustBring(part: GainFigures, work: number): number {
	const forEver = shelfForEver(part);
	if (forEver === null) return part.scrapCents + work + shelfCost(part);
	return (holding(part) + work) / reach(part) - forEver;
}

/**
 * The used price at which the gain is nil, for either timing, in cents and unrounded: the gain
 * solved for the price. Null where no price helps: never good, always back, or never called for.
 */
export function breakEven(part: GainFigures): BreakEven | null {
	const reached = reach(part);
	const good = part.chanceGood;
	if (good === 0 || part.comeBack === 1 || reached === 0) return null;
	const scrap = part.scrapCents;
	const labourNow = part.labourNow * part.minutesNow;
	const allNow = part.labourNow * (part.minutesNow + part.minutesLater);
	const saleWhenCalled =
		(mustBring(part, labourNow) + part.labour * part.minutesLater - (1 - good) * scrap) / good;
	const saleNow = mustBring(part, allNow / good);
	const price = (sale: number) =>
		(sale + part.comeBack * part.comeBackCents + part.kitCents) / (1 - part.comeBack);
	return { whenCalled: price(saleWhenCalled), now: price(saleNow) };
}
