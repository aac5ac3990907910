import { amount, check } from './figures';

export type VerdictWord = 'keep' | 'close call' | 'let it go';

const MOST = 1e12;

/**
 * The word for a gain. In: the gain in cents (it may be below nil) and the shop's margin in cents,
 * 0 or more. Out: keep at the margin or above; a close call above nil; else let it go.
 * Throws WorthError naming the field.
 */
export function verdictWord(input: { gainCents: number; marginCents: number }): VerdictWord {
	check(input, {
		gainCents: { unit: 'gain in cents', least: -MOST, most: MOST },
		marginCents: amount('margin in cents')
	});
	if (input.gainCents >= input.marginCents) return 'keep';
	return input.gainCents > 0 ? 'close call' : 'let it go';
}
