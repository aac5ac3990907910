import type { GainFigures } from './gain-input';
import { bestGain, holding, sale } from './values';

// a gain of less than a millionth of a cent is nil with rounding on it
const NOISE = 1e-6;

/** Gain in its falling form: slope x reach - floor, all in cents. */
interface Line {
	slope: number;
	floor: number;
}

function largestByReach(line: Line, part: GainFigures): number {
	const theta = part.moneyRate + part.dyingRate;
	if (line.slope <= 0 || part.callsPerYear === 0) return 0;
	const needed = line.floor / line.slope;
	if (needed >= 1) return 0;
	if (needed <= 0) return Infinity;
	// log1p keeps the digits when money and dying are small against the calls
	return Math.floor(Math.log(needed) / -Math.log1p(theta / part.callsPerYear));
}

function withWear(part: GainFigures): number {
	const good = part.chanceGood;
	const overScrap = good * (sale(part) - part.scrapCents);
	const held = holding(part);
	const allNow = part.labourNow * (part.minutesNow + part.minutesLater);
	const whenCalled = largestByReach(
		{
			slope: overScrap + held - part.labour * part.minutesLater,
			floor: held + part.labourNow * part.minutesNow
		},
		part
	);
	if (part.workWhenCalledOnly) return whenCalled;
	const now = { slope: overScrap + good * held, floor: good * held + allNow };
	return Math.max(whenCalled, largestByReach(now, part));
}

function withoutWear(part: GainFigures): number {
	const overScrap = part.chanceGood * (sale(part) - part.scrapCents);
	const largest = (inHand: number, yearly: number) => {
		if (inHand <= 0) return 0;
		return yearly === 0 ? Infinity : Math.floor((inHand * part.callsPerYear) / yearly);
	};
	const now = part.labourNow * part.minutesNow;
	const whenCalled = largest(overScrap - now - part.labour * part.minutesLater, part.shelfCents);
	if (part.workWhenCalledOnly) return whenCalled;
	return Math.max(
		whenCalled,
		largest(overScrap - now - part.labourNow * part.minutesLater, part.chanceGood * part.shelfCents)
	);
}

/**
 * How many of these to keep: the largest place at which the gain is still above nil, whatever the
 * timing. Does not depend on the place of the part that is asked about. Null: without limit.
 */
export function keepUpTo(part: GainFigures): number | null {
	const pays = (place: number) => bestGain({ ...part, place }) > NOISE;
	const theta = part.moneyRate + part.dyingRate;
	let largest = theta === 0 ? withoutWear(part) : withWear(part);
	if (largest > Number.MAX_SAFE_INTEGER) return null;
	// the closed form may sit a hair beside a whole number: the gain itself decides
	if (largest > 0 && !pays(largest)) largest -= 1;
	else if (pays(largest + 1)) largest += 1;
	return largest;
}
