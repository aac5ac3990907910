import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { betaBelow, betaQuantile, studentQuantile } from './incomplete-beta';
import { gammaBelow, gammaQuantile } from './incomplete-gamma';
import { learnChance, learnRate, learnShare, WorthError } from './index';
import { logGamma } from './log-gamma';

const seen = (successes: number, trials: number) => ({ successes, failures: trials - successes });
/** The exact interval of a proportion, Clopper and Pearson 1934: low and high lean either way. */
const exact = (successes: number, trials: number, level: number) => [
	learnChance({ prior: { alpha: 0, beta: 1 }, observations: seen(successes, trials), level }).low,
	learnChance({ prior: { alpha: 1, beta: 0 }, observations: seen(successes, trials), level }).high
];
const normalQuantile = (share: number) =>
	Math.sign(share - 0.5) * Math.sqrt(2 * gammaQuantile(Math.abs(2 * share - 1), 0.5, 1));
const wilson = (successes: number, trials: number, z: number) => {
	const p = successes / trials;
	const middle = p + (z * z) / (2 * trials);
	const reach = z * Math.sqrt((p * (1 - p)) / trials + (z * z) / (4 * trials * trials));
	return [middle - reach, middle + reach].map((x) => x / (1 + (z * z) / trials));
};

describe('a chance, against published intervals', () => {
	it.each([
		// NIST/SEMATECH e-Handbook of Statistical Methods 2012, section 7.2.4.1
		[4, 20, 0.9, 0.0713539, 0.4010281, 2e-6],
		// Keller 2011, Six Sigma Demystified, p. 213
		[24, 100, 0.95, 0.160225, 0.335735, 2e-6],
		// Conover 1971, Practical Nonparametric Statistics; value from memory
		[682, 925, 0.95, 0.7076683, 0.7654066, 2e-7],
		// small counts, worked out
		[9, 10, 0.95, 0.55498, 0.99747, 5e-6],
		[0, 10, 0.95, 0, 0.3085, 5e-6]
	])('exact, %i of %i at %d', (successes, trials, level, low, high, within) => {
		const [least, most] = exact(successes, trials, level);
		expect(Math.abs(least! - low)).toBeLessThan(within);
		expect(Math.abs(most! - high)).toBeLessThan(within);
	});

	it('one-sided: Keller 2011; the rule of three at nothing in twenty', () => {
		expect(exact(24, 100, 0.9)[0]).toBeCloseTo(0.171348, 6);
		expect(exact(0, 20, 0.9)[1]).toBeCloseTo(0.13911, 5);
		expect(exact(0, 20, 0.9)[1]).toBeLessThan(3 / 20);
	});

	// Wilson 1927; NIST/SEMATECH e-Handbook 2012, section 7.2.4.1, for 13 % of 200
	it('scores by a normal quantile', () => {
		expect(wilson(26, 200, normalQuantile(0.95))[0]).toBeCloseTo(0.09577, 5);
		const [low, high] = wilson(9, 10, normalQuantile(0.975));
		expect([low, high].map((x) => Math.round(x! * 1e5))).toEqual([59_585, 98_212]);
		expect(wilson(0, 10, normalQuantile(0.975))[1]).toBeCloseTo(0.27753, 5);
	});

	// OpenStax 2013, Introductory Statistics, "plus four": 6 of 25 at 95 %, 13 of 50 at 90 %
	it('plus four', () => {
		for (const [successes, trials, level, low, high] of [
			[6, 25, 0.95, 0.113, 0.439],
			[13, 50, 0.9, 0.178, 0.378]
		] as const) {
			const prior = { alpha: 2, beta: 2 };
			const { mean } = learnChance({ prior, observations: seen(successes, trials) });
			const reach = normalQuantile((1 + level) / 2) * Math.sqrt((mean * (1 - mean)) / (trials + 4));
			expect(Math.abs(mean - reach - low)).toBeLessThan(0.001);
			expect(Math.abs(mean + reach - high)).toBeLessThan(0.001);
		}
	});

	// Gelman and others 2013, Bayesian Data Analysis, section 2.4: 437 girls of 980
	it('from nothing known', () => {
		const learned = learnChance({ prior: { alpha: 1, beta: 1 }, observations: seen(437, 980) });
		expect(learned.mean).toBeCloseTo(0.44602851, 8);
		expect(learned.low).toBeCloseTo(0.41506549, 8);
		expect(learned.high).toBeCloseTo(0.47719977, 8);
		expect(learned.observations).toBe(980);
	});

	// Laplace 1774, rule of succession
	it('the next one', () => {
		const even = { alpha: 1, beta: 1 };
		expect(learnChance({ prior: even, observations: seen(9, 10) }).mean).toBeCloseTo(10 / 12, 12);
		expect(learnChance({ prior: even, observations: seen(4, 5) }).mean).toBeCloseTo(5 / 7, 12);
	});

	it('few do not swing it: two bad ones of a kind believed at 0.9', () => {
		const prior = { mean: 0.9, worth: 4 };
		const learned = learnChance({ prior, observations: { successes: 0, failures: 2 } });
		expect(learned.mean).toBeCloseTo(3.6 / 6, 12);
		expect(learnChance({ prior, observations: seen(0, 0) }).mean).toBeCloseTo(0.9, 12);
	});
});

describe('a rate, against published figures', () => {
	// NIST/SEMATECH e-Handbook 2012, section 8.2.5, "50/95" prior
	it('fits the prior', () => {
		expect(gammaBelow(0.001667 * 1522.46, 2.863)).toBeCloseTo(0.5001232, 7);
		expect(gammaBelow(0.004 * 1522.46, 2.863)).toBeCloseTo(0.9499963, 7);
		expect(gammaBelow(1522.506 / 600, 2.863055)).toBeCloseTo(0.5, 5);
		expect(gammaBelow(1522.506 / 250, 2.863055)).toBeCloseTo(0.95, 5);
	});

	// NIST/SEMATECH e-Handbook 2012, section 8.4.6; example values from memory
	it('adds failures and hours', () => {
		const prior = { shape: 2, years: 1400 };
		const lives = [0.9, 0.8, 0.5].map((sure) => 1 / gammaQuantile(sure, 4, 3309));
		expect(lives.map((hours) => hours.toFixed(2))).toEqual(['495.30', '600.00', '901.13']);
		const learned = learnRate({ prior, observations: { calls: 2, years: 1909 }, level: 0.8 });
		expect(1 / learned.high).toBeCloseTo(495.3, 2);
		expect(600 * gammaQuantile(0.8, 4, 1) - 1400).toBeCloseTo(1909.03, 2);
	});

	// Gelman and others 2013, Bayesian Data Analysis, section 2.6, asthma; values from memory
	it('learns slowly from few', () => {
		const prior = { shape: 3, years: 5 };
		const few = learnRate({ prior, observations: { calls: 3, years: 2 } });
		const many = learnRate({ prior, observations: { calls: 30, years: 20 } });
		expect([few.mean, many.mean]).toEqual([6 / 7, 33 / 25]);
		expect(1 - gammaBelow(7, 6)).toBeCloseTo(0.30071, 5);
		expect(1 - gammaBelow(25, 33)).toBeCloseTo(0.92854, 5);
		expect(many.high - many.low).toBeLessThan(few.high - few.low);
		expect([few.observations, few.years]).toEqual([3, 2]);
	});

	it('gives no sale next year the chance (7/8)^6', () => {
		let chance = 0;
		const step = 1e-3;
		for (let rate = step / 2; rate < 12; rate += step) {
			const slice = gammaBelow((rate + step / 2) * 7, 6) - gammaBelow((rate - step / 2) * 7, 6);
			chance += slice * Math.exp(-rate);
		}
		expect(chance).toBeCloseTo(0.448795, 6);
	});
});

describe('a share', () => {
	const prior = { mean: 0.6, worth: 5 };

	it('is shrunk toward what was believed', () => {
		const learned = learnShare({ prior, observations: [0.4, 0.5, 0.45] });
		expect(learned.mean).toBeCloseTo((5 * 0.6 + 1.35) / 8, 12);
		expect(learned).toMatchObject({ observations: 3 });
		expect(learnShare({ prior, observations: [] }).mean).toBeCloseTo(0.6, 12);
	});

	it('takes the sales in short as well', () => {
		const list = [0.3, 0.55, 0.48, 0.6];
		const mean = 1.93 / 4;
		const spread = Math.sqrt(list.reduce((sum, each) => sum + (each - mean) ** 2, 0) / 4);
		const short = learnShare({ prior, observations: { count: 4, mean, spread } });
		const long = learnShare({ prior, observations: list });
		for (const field of ['mean', 'low', 'high'] as const)
			expect(short[field]).toBeCloseTo(long[field], 12);
	});

	// Student 1908, "The Probable Error of a Mean": the table at 5 and 9 degrees, and nothing believed
	it('has the interval of the t-table', () => {
		expect(studentQuantile(0.975, 5)).toBeCloseTo(2.5706, 4);
		expect(studentQuantile(0.975, 9)).toBeCloseTo(2.2622, 4);
		expect(studentQuantile(0.025, 9)).toBeCloseTo(-2.2622, 4);
		expect(studentQuantile(0.975, 1)).toBeCloseTo(12.7062, 4);
	});

	it('narrows as sales come', () => {
		const width = (count: number) => {
			const told = learnShare({ prior, observations: { count, mean: 0.5, spread: 0.1 } });
			return told.high - told.low;
		};
		expect(width(40)).toBeLessThan(width(10));
		expect(width(10)).toBeLessThan(width(0));
	});
});

describe('the functions beneath, by a slow way of their own', () => {
	const within = (min: number, max: number) => fc.double({ min, max, noNaN: true });
	/** Area under a curve by Simpson's rule. */
	const area = (curve: (x: number) => number, from: number, to: number, steps = 12_000) => {
		const step = (to - from) / steps;
		let sum = curve(from) + curve(to);
		for (let at = 1; at < steps; at += 1) sum += curve(from + at * step) * (at % 2 ? 4 : 2);
		return (sum * step) / 3;
	};

	it('log gamma: factorials and the half', () => {
		let factorial = 1;
		for (let n = 1; n < 60; n += 1) {
			expect(logGamma(n) / (Math.log(factorial) || 1)).toBeCloseTo(n < 3 ? 0 : 1, 12);
			factorial *= n;
		}
		expect(logGamma(0.5)).toBeCloseTo(0.5 * Math.log(Math.PI), 13);
	});

	it('incomplete beta and gamma: the area under their curves', () => {
		fc.assert(
			fc.property(within(3, 40), within(3, 40), within(0, 1), (a, b, x) => {
				const beta = (at: number) => at ** (a - 1) * (1 - at) ** (b - 1);
				const below = area(beta, 0, x) / area(beta, 0, 1);
				expect(betaBelow(x, a, b)).toBeCloseTo(below, 8);
				const gamma = (at: number) => Math.exp((a - 1) * Math.log(at || 1e-300) - at);
				expect(gammaBelow(x * 60, a)).toBeCloseTo(area(gamma, 0, x * 60) / area(gamma, 0, 200), 7);
			}),
			{ numRuns: 25 }
		);
	});

	it('quantiles go back to where they came from', () => {
		fc.assert(
			fc.property(within(0.001, 0.999), within(0.05, 300), within(0.05, 300), (share, a, b) => {
				expect(gammaBelow(gammaQuantile(share, a, b) * b, a)).toBeCloseTo(share, 10);
				fc.pre(a > 0.5 && b > 0.5);
				expect(betaBelow(betaQuantile(share, a, b), a, b)).toBeCloseTo(share, 10);
			}),
			{ numRuns: 60 }
		);
	});
});

it.each([
	[() => learnChance({ prior: { alpha: -1, beta: 1 }, observations: seen(0, 0) }), 'alpha'],
	[() => learnChance({ prior: { mean: 1.5, worth: 4 }, observations: seen(0, 0) }), 'mean'],
	[() => learnChance({ prior: { alpha: 0, beta: 0 }, observations: seen(0, 0) }), 'prior'],
	[() => learnChance({ prior: { alpha: 1, beta: 1 } } as never), 'observations'],
	[() => learnChance({ prior: { alpha: 1, beta: 1 }, observations: seen(3, 2) }), 'failures'],
	[
		() => learnRate({ prior: { mean: 1, worth: 0 }, observations: { calls: 1, years: 0 } }),
		'prior'
	],
	[
		() => learnRate({ prior: { mean: 1, worth: 2 }, observations: { calls: NaN, years: 0 } }),
		'calls'
	],
	[
		() => learnShare({ prior: { mean: 0.6, worth: 5 }, observations: [0.5, 1.2] }),
		'observations[1]'
	],
	[() => learnShare({ prior: { mean: 0.6, worth: 0 }, observations: [] }), 'prior'],
	[() => learnShare({ prior: { mean: 0.6, worth: 5 }, observations: [], level: 1 }), 'level']
])('learning refuses what is no figure, by name (%#)', (learn, field) => {
	expect(learn).toThrow(WorthError);
	expect(learn).toThrow(expect.objectContaining({ field }));
});
