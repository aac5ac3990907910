import { amount, check, type Figure } from './figures';
import { wholeCents } from './money';

export interface CleaningInput {
	alpha: number;
	beta: number;
	failures: number;
	worthCents: number;
	attemptCents: number;
}

export interface Cleaning {
	go: boolean;
	inHandCents: number;
	stopAfter: number | null;
}

const prior: Figure = { unit: 'weight of the Beta prior', least: 0.001 };

const figures = {
	alpha: prior,
	beta: prior,
	failures: { unit: 'failed attempts', whole: true },
	worthCents: amount('what it is worth more when it comes right, in cents'),
	attemptCents: amount('cost of one attempt in cents')
};

function inHand(input: CleaningInput, failures: number): number {
	const chance = input.alpha / (input.alpha + input.beta + failures);
	return chance * input.worthCents - input.attemptCents;
}

function stop(input: CleaningInput): number | null {
	if (inHand(input, 0) <= 0) return 0;
	if (input.attemptCents === 0) return null;
	const edge = (input.alpha * input.worthCents) / input.attemptCents - input.alpha - input.beta;
	if (edge > Number.MAX_SAFE_INTEGER) return null;
	const after = Math.max(0, Math.floor(edge));
	return inHand(input, after) > 0 ? after + 1 : after;
}

/**
 * Whether one more attempt at cleaning pays. The chance of coming right starts as Beta(alpha, beta)
 * and only falls with each failure in a row, so looking one step ahead is best.
 * In: weights of 0.001 or more; failures, a whole number; amounts in cents. Out: whether to go on, what is
 * in hand on the next attempt (whole cents), and after how many failures to stop (null: never,
 * where an attempt costs next to nothing). Throws WorthError naming the field.
 */
export function keepCleaning(input: CleaningInput): Cleaning {
	check(input, figures);
	const expected = inHand(input, input.failures);
	return { go: expected > 0, inHandCents: wholeCents(expected), stopAfter: stop(input) };
}
