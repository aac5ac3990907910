import { amount, check, share } from './figures';
import { wholeCents } from './money';

export interface OwnUseInput {
	newCents: number;
	/** Share of the new price that using one of its own saves the shop. */
	share: number;
	/** What it is worth that the machine leaves today. */
	leavesTodayCents?: number | null;
}

/**
 * What a part is worth that the shop fits on its own job, in place of the used price: what it saves
 * of the new price, plus what it is worth that the machine leaves today. `callsPerYear` is then the
 * shop's own use. In: cents, 0 or more; share 0 to 1. Out: whole cents, not rounded to a step.
 * Throws WorthError naming the field.
 */
export function ownUse(input: OwnUseInput): { usedCents: number } {
	check(input, {
		newCents: amount('price of the new part in cents'),
		share: share('share of the new price that is saved'),
		leavesTodayCents: { unit: 'what leaving today is worth, in cents', optional: true }
	});
	return { usedCents: wholeCents(input.newCents * input.share + (input.leavesTodayCents ?? 0)) };
}
