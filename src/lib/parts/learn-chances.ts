import type { Policy } from '$lib/people/policy';
import { chanceLevel, worseLevel, type Level } from '$lib/trade';
import { learnChance, learnShare } from '$lib/worth';
import { figuresOf } from './kind-figures';
import { once, unmoved } from './learn-once';
import type { Figure, Observed, Taught, TestsSeen } from './learned-view';

/** Which chances a test speaks for: the level of the cause, half of it where the cause was only told. */
function levelsOf({ kind, cause, secondCause, sureness }: TestsSeen): [Level, number][] {
	const unknown = chanceLevel(kind, 'unknown');
	const first = cause ? chanceLevel(kind, cause) : unknown;
	const level = secondCause ? worseLevel(first, chanceLevel(kind, secondCause)) : first;
	return cause && sureness === 'told'
		? [
				[level, 0.5],
				[unknown, 0.5]
			]
		: [[level, 1]];
}

interface Count {
	successes: number;
	failures: number;
}

/** How much a row of tests says of a level. */
function weightAt(row: TestsSeen | undefined, level: Level): number {
	if (!row) return 0;
	return levelsOf(row).reduce((sum, [at, weight]) => sum + (at === level ? weight : 0), 0);
}

function counted(tests: readonly TestsSeen[]): Map<string, Count> {
	const seen = new Map<string, Count>();
	for (const row of tests)
		for (const [level, weight] of levelsOf(row)) {
			const key = `${row.kind} ${level}`;
			const { successes, failures } = seen.get(key) ?? { successes: 0, failures: 0 };
			seen.set(key, {
				successes: successes + weight * row.passed,
				failures: failures + weight * row.failed
			});
		}
	return seen;
}

/** The chance of each kind at each level, by its bench tests. */
export function chances({ tests }: Observed, policy: Policy): Taught['chance'] {
	const seen = counted(tests);
	const keep = once<Figure>();
	return (kindId, level, less) => {
		const usual = policy.chances[level];
		const all = seen.get(`${kindId} ${level}`);
		// what is ruined stays so, whatever a test said: it is not for sale
		if (!all || level === 'ruined') return unmoved(usual);
		const own = weightAt(less, level);
		const successes = Math.max(0, all.successes - own * (less?.passed ?? 0));
		const failures = Math.max(0, all.failures - own * (less?.failed ?? 0));
		if (successes + failures === 0) return unmoved(usual);
		const prior = { mean: usual, worth: policy.priors.chance };
		return keep(`${kindId} ${level} ${successes} ${failures}`, () => ({
			usual,
			...learnChance({ prior, observations: { successes, failures } })
		}));
	};
}

/** The share that comes back, by what went out. */
export function comeBacks({ outs }: Observed, policy: Policy): Taught['comeBack'] {
	const keep = once<Figure>();
	const byKind = new Map(outs.map((row) => [row.kind, row]));
	return (kindId) => {
		const usual = figuresOf(kindId, policy).comeBack;
		const seen = byKind.get(kindId);
		if (!seen || seen.out === 0) return unmoved(usual);
		const failures = Math.max(0, seen.out - seen.back);
		const observations = { successes: seen.out - failures, failures };
		const prior = { mean: usual, worth: policy.priors.comeBacks };
		return keep(kindId, () => ({ usual, ...learnChance({ prior, observations }) }));
	};
}

/** The share of new that each grade fetches, by what was paid. */
export function shares({ sales }: Observed, policy: Policy): Taught['share'] {
	const keep = once<Figure>();
	return (grade) =>
		keep(grade, () => {
			const usual = policy.shares[grade];
			// where a copy holds the price down, what was paid says nothing of the share of new
			const paid = sales.filter(
				(sale) =>
					sale.grade === grade &&
					(sale.copyCents === null || policy.copyCap * sale.copyCents >= usual * sale.newCents)
			);
			if (paid.length === 0) return unmoved(usual);
			const observations = paid.map((sale) => Math.min(1, sale.paidCents / sale.newCents));
			const prior = { mean: usual, worth: policy.priors.shareSales };
			return { usual, ...learnShare({ prior, observations }) };
		});
}
