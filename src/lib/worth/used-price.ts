import { amount, check, share } from './figures';
import { withoutNoise } from './money';
import { WorthError } from './worth-error';

/** Prices under `underCents` (all, when left out) are rounded to `stepCents`. */
export interface Step {
	underCents?: number | null;
	stepCents: number;
}

export interface UsedPriceInput {
	newCents: number;
	copyCents?: number | null;
	share: number;
	copyCap: number;
	stepCents: number | readonly Step[];
	leastCents: number;
}

export interface UsedPrice {
	usedCents: number;
	cappedBy: 'copy' | null;
	belowLeast: boolean;
}

const figures = {
	newCents: amount('price of the new part in cents'),
	copyCents: { unit: 'price of a copy in cents', optional: true },
	share: share('share of the new price'),
	copyCap: share('share of the price of a copy'),
	leastCents: amount('least price in cents')
};

const stepFigures = {
	stepCents: { unit: 'rounding step in cents', least: 1, whole: true },
	underCents: { unit: 'cents up to which a step counts', optional: true }
};

function checkSteps(steps: UsedPriceInput['stepCents']): readonly Step[] {
	const table = typeof steps === 'number' ? [{ stepCents: steps }] : steps;
	if (!Array.isArray(table) || table.length === 0) {
		throw new WorthError('stepCents', 'stepCents: a step in cents, or a table of steps');
	}
	for (const step of table as readonly Step[]) {
		check(step, stepFigures);
	}
	return table as readonly Step[];
}

function stepFor(cents: number, table: readonly Step[]): number {
	const fitting = table.find((step) => step.underCents == null || cents < step.underCents);
	return (fitting ?? table[table.length - 1])?.stepCents ?? 1;
}

/**
 * What the counter asks for a used part: the share of new that its grade fetches, at most the cap
 * of what a copy costs, rounded to the shop's step (down where the copy caps it). The step is
 * chosen from the price before rounding. In: amounts in cents, 0 or more; shares 0 to 1; one step
 * or a table of them. Out: cents, what capped it, and whether it lies under the least price (which
 * is said beside a verdict and does not change it). Throws WorthError naming the field.
 */
export function usedPrice(input: UsedPriceInput): UsedPrice {
	check(input, figures);
	const table = checkSteps(input.stepCents);
	const byShare = withoutNoise(input.share * input.newCents);
	const cap = input.copyCents == null ? null : withoutNoise(input.copyCap * input.copyCents);
	const capped = cap !== null && cap < byShare;
	const exact = capped ? cap : byShare;
	const step = stepFor(exact, table);
	const steps = withoutNoise(exact / step);
	const usedCents = (capped ? Math.floor(steps) : Math.round(steps)) * step;
	return {
		usedCents,
		cappedBy: capped ? 'copy' : null,
		belowLeast: usedCents < input.leastCents
	};
}
