import { check, type Figure } from './figures';

const money: Figure = { unit: 'share of the money per year', most: 10 };
const dying: Figure = { unit: 'share that dies per year, below 1', most: 0.999999 };

/**
 * A yearly per cent, as a shop says it, into the continuous yearly rate that the formulas take.
 * In: the yearly share (0.10 is 10 %) and what it is of. Money bears interest: ln(1 + share), share
 * 0 to 10. Dying is a hazard: -ln(1 - share), share 0 to below 1. Out: rate per year.
 * Throws WorthError naming `yearly`.
 */
export function yearlyToContinuous(yearly: number, of: 'money' | 'dying'): number {
	check({ yearly }, { yearly: of === 'money' ? money : dying });
	return of === 'money' ? Math.log1p(yearly) : -Math.log1p(-yearly);
}
