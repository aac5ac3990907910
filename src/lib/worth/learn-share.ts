import { check, share } from './figures';
import { studentQuantile } from './incomplete-beta';
import { meanPrior, tails, within, type Learned, type MeanPrior } from './learn-input';
import { WorthError } from './worth-error';

/** Many observations in short: how many, their mean and their spread (standard deviation). */
export interface SharesSeen {
	count: number;
	mean: number;
	spread: number;
}

export interface ShareToLearn {
	/** `spread`: how far single sales lie from the mean as a rule; 0.15 when left out, no source. */
	prior: MeanPrior & { spread?: number | null };
	/** Each share of new that was really paid, or all of them in short. */
	observations: readonly number[] | SharesSeen;
	/** Chance that the interval holds; 0.95 when left out. */
	level?: number | null;
}

const USUAL_SPREAD = 0.15;

function checkList(list: readonly number[]): void {
	for (const [index, paid] of list.entries()) {
		const field = `observations[${index}]`;
		check({ [field]: paid }, { [field]: share('share of new that was paid') });
	}
}

function inShort(seen: ShareToLearn['observations']): SharesSeen {
	within(seen as object, 'observations', 'count, mean and spread, or a list of shares');
	if (!('length' in seen)) {
		check(seen, {
			count: { unit: 'sales seen', whole: true },
			mean: share('mean share that was paid'),
			spread: share('standard deviation of the shares')
		});
		return seen;
	}
	checkList(seen);
	const count = seen.length;
	if (count === 0) return { count, mean: 0, spread: 0 };
	const mean = seen.reduce((sum, paid) => sum + paid, 0) / count;
	const squares = seen.reduce((sum, paid) => sum + (paid - mean) ** 2, 0);
	return { count, mean, spread: Math.sqrt(squares / count) };
}

/**
 * The share of new that a grade fetches, shrunk from what was paid toward what was believed: a
 * normal mean with its spread learned along. In: prior mean 0 to 1 and the sales that it is worth;
 * shares paid, 0 to 1. Out: the shrunk mean, an interval by Student's t cut to 0 to 1, sales seen.
 * Throws WorthError naming the field; nothing believed and nothing seen is refused.
 * Source: Gelman and others 2013, "Bayesian Data Analysis", section 3.3.
 */
export function learnShare(input: ShareToLearn): Learned {
	const tail = tails(input);
	const prior = within(input.prior, 'prior', 'mean and worth');
	const { mean: believed, worth } = meanPrior(prior, 'share of new', 'sales it is worth', 1);
	check(prior, { spread: { ...share('spread of single sales'), optional: true } });
	const seen = inShort(input.observations);
	const weight = worth + seen.count;
	if (weight === 0) throw new WorthError('prior', 'prior: worth above 0 where no sale was seen');
	const mean = (worth * believed + seen.count * seen.mean) / weight;
	const apart = ((worth * seen.count) / weight) * (seen.mean - believed) ** 2;
	const usual = worth * (prior.spread ?? USUAL_SPREAD) ** 2;
	const scale = Math.sqrt((usual + seen.count * seen.spread ** 2 + apart) / weight / weight);
	const reach = scale === 0 ? 0 : studentQuantile(tail.high, weight) * scale;
	return {
		mean,
		low: Math.max(0, mean - reach),
		high: Math.min(1, mean + reach),
		observations: seen.count
	};
}
