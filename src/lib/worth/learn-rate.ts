import { amount, check } from './figures';
import { gammaQuantile } from './incomplete-gamma';
import { meanPrior, tails, within, type Learned, type MeanPrior } from './learn-input';
import { WorthError } from './worth-error';

export interface RateToLearn {
	/** Shape and years of a Gamma, or its mean per year with how many years it is worth. */
	prior: { shape: number; years: number } | MeanPrior;
	observations: { calls: number; years: number };
	/** Chance that the interval holds; 0.95 when left out. */
	level?: number | null;
}

const shapeAndYears = { shape: amount('calls that the prior is worth'), years: amount('years') };

function gammaOf(prior: RateToLearn['prior']): { shape: number; years: number } {
	within(prior, 'prior', 'shape and years, or mean and worth');
	if (!('mean' in prior)) {
		check(prior, shapeAndYears);
		return prior;
	}
	const { mean, worth } = meanPrior(prior, 'calls per year', 'years that the prior is worth');
	return { shape: mean * worth, years: worth };
}

/**
 * Calls per year from what was believed and what came: a Gamma with the calls added to its shape
 * and the years watched to its years. In: the prior as shape and years or as mean and worth, 0 or
 * more; calls, 0 or more (parts of one where a search counts less), years watched. Out: mean and
 * interval in calls per year, calls observed. Throws WorthError naming the field; no years at all
 * are refused. Source: Gelman and others 2013, "Bayesian Data Analysis", section 2.6.
 */
export function learnRate(input: RateToLearn): Learned & { years: number } {
	const tail = tails(input);
	const prior = gammaOf(input.prior);
	const seen = within(input.observations, 'observations', 'calls and years');
	check(seen, { calls: amount('calls that came'), years: amount('years watched') });
	const shape = prior.shape + seen.calls;
	const years = prior.years + seen.years;
	if (years === 0) throw new WorthError('prior', 'prior: years above 0 where none were watched');
	return {
		mean: shape / years,
		low: gammaQuantile(tail.low, shape, years),
		high: gammaQuantile(tail.high, shape, years),
		observations: seen.calls,
		years: seen.years
	};
}
