import { breakEven } from './break-even';
import { gainFigures, type GainInput } from './gain-input';
import { keepUpTo } from './keep-up-to';
import { wholeCents } from './money';
import { bestGain, bestTiming, termsOf, type Terms } from './values';
import { everCalled, waitYears } from './waiting';

export interface Gain {
	gainCents: number;
	timing: 'when-called' | 'now';
	keepUpTo: number | null;
	breakEvenUsedCents: number | null;
	waitYears: number | null;
	everCalled: number;
	gainPerMinute: number | null;
	terms: Terms;
}

// a price beyond any shop is as good as none
function payable(cents: number): number | null {
	return cents < 1e12 ? wholeCents(cents) : null;
}

/**
 * What keeping one part is worth to the shop against scrapping it now, and when to do the work on
 * it. Waits for the k-th of a Poisson stream of calls; the part may be bad, may come back, and its
 * cleaning and testing may wait until somebody calls.
 *
 * In: see GainInput. Out: `gainCents` and `breakEvenUsedCents` in whole cents (the lower price of
 * the timings that there are; null where no price helps), `timing` of the work, `keepUpTo` units (null: no
 * limit), `waitYears` (null: nobody calls), `everCalled` 0 to 1, `gainPerMinute` in cents for each
 * minute spent now (null: none is), and the unrounded terms.
 * Throws WorthError naming the field, its unit and its range.
 * Source: Rosenfield 1985, "Salvaging of Excess Inventory", with bad parts and waiting work added.
 */
export function gain(input: GainInput): Gain {
	const part = gainFigures(input);
	const terms = termsOf(part);
	const worth = bestGain(part, terms);
	const even = breakEven(part);
	const least =
		even && (part.workWhenCalledOnly ? even.whenCalled : Math.min(even.whenCalled, even.now));
	return {
		gainCents: wholeCents(worth),
		timing: bestTiming(part, terms),
		keepUpTo: keepUpTo(part),
		breakEvenUsedCents: least === null ? null : payable(least),
		waitYears: waitYears(part),
		everCalled: everCalled(part),
		gainPerMinute: part.minutesNow === 0 ? null : worth / part.minutesNow,
		terms
	};
}

/**
 * The gain alone, for long lists: `gainCents` of gain() to the cent. In: see GainInput. Out: whole
 * cents. Throws WorthError naming the field.
 */
export const gainCents = (input: GainInput): number => wholeCents(bestGain(gainFigures(input)));
