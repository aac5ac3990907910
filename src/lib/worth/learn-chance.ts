import { amount, check } from './figures';
import { betaQuantile } from './incomplete-beta';
import { meanPrior, tails, within, type Learned, type MeanPrior } from './learn-input';
import { WorthError } from './worth-error';

export interface ChanceToLearn {
	/** Weights of a Beta, or its mean with how many observations it is worth. */
	prior: { alpha: number; beta: number } | MeanPrior;
	observations: { successes: number; failures: number };
	/** Chance that the interval holds; 0.95 when left out. */
	level?: number | null;
}

function weights(prior: ChanceToLearn['prior']): { alpha: number; beta: number } {
	within(prior, 'prior', 'alpha and beta, or mean and worth');
	if (!('mean' in prior)) {
		check(prior, { alpha: amount('weight of successes'), beta: amount('weight of failures') });
		return prior;
	}
	const { mean, worth } = meanPrior(prior, 'chance', 'observations that the prior is worth', 1);
	return { alpha: mean * worth, beta: (1 - mean) * worth };
}

/**
 * A chance from what was believed and what was seen: a Beta with every success and failure added.
 * In: the prior as weights or as mean and worth, 0 or more; counts, 0 or more (parts of one where a
 * sighting counts less). Out: mean and an interval with the same chance outside on either side, 0
 * to 1, and the number of observations. Throws WorthError naming the field; nothing believed and
 * nothing seen is refused. Source: Gelman and others 2013, "Bayesian Data Analysis", section 2.4.
 */
export function learnChance(input: ChanceToLearn): Learned {
	const tail = tails(input);
	const prior = weights(input.prior);
	const seen = within(input.observations, 'observations', 'successes and failures');
	check(seen, { successes: amount('successes seen'), failures: amount('failures seen') });
	const alpha = prior.alpha + seen.successes;
	const beta = prior.beta + seen.failures;
	if (alpha + beta === 0) {
		throw new WorthError('prior', 'prior: weight above 0 where nothing has been observed');
	}
	return {
		mean: alpha / (alpha + beta),
		low: betaQuantile(tail.low, alpha, beta),
		high: betaQuantile(tail.high, alpha, beta),
		observations: seen.successes + seen.failures
	};
}
