import { estimate, ratio, type Estimate } from './intervals';
import { BOUND, LEARNING, resultOf, TOLD, type Result } from './results';
import { KEEP_NOTHING } from './thumb';

type Results = ReadonlyMap<string, Result>;

const minus = (a: readonly number[], b: readonly number[]) =>
	a.map((value, at) => value - (b[at] ?? 0));

const figure = ({ mean, half }: Estimate, digits = 0, times = 1) =>
	`${(mean * times).toFixed(digits)} ± ${(half * times).toFixed(digits)}`;

/** What is earned above keeping nothing. */
export const above = (results: Results, name: string, which: 'money' | 'later' = 'money') =>
	minus(resultOf(results, name)[which], resultOf(results, KEEP_NOTHING.name)[which]);

/** One line for each way: money a year, per bench hour, and its share of the clairvoyant's. */
export function table(results: Results): string[] {
	const bound = resultOf(results, BOUND).money;
	const head = ['', '$ a year', '$ a bench hour', '% of clairvoyant'];
	const rows = [...results.values()].map((result) => [
		result.name,
		figure(estimate(result.money)),
		result.hours.some((hours) => hours > 0)
			? figure(ratio(above(results, result.name), result.hours), 1)
			: '-',
		figure(ratio(result.money, bound), 1, 100)
	]);
	return [head, ...rows].map(([name = '', ...cells]) =>
		[name.padEnd(26), ...cells.map((cell) => cell.padStart(20))].join('')
	);
}

export interface Goal {
	said: string;
	met: boolean;
}

/** The calculator against every rule of thumb, seed by seed: better outside the interval. */
export function beatsAll(results: Results, thumbs: readonly string[]): Goal[] {
	const own = resultOf(results, LEARNING).money;
	return thumbs.map((name) => {
		const ahead = estimate(minus(own, resultOf(results, name).money));
		return {
			said: `ahead of "${name}" by $ ${figure(ahead)} a year`,
			met: ahead.mean - ahead.half > 0
		};
	});
}

/** The calculator's share of what it would make if it were told, and of what is above scrap. */
export function shareOfTold(results: Results, which: 'money' | 'later', least: number): Goal {
	const share = ratio(resultOf(results, LEARNING)[which], resultOf(results, TOLD)[which]);
	const strict = ratio(above(results, LEARNING, which), above(results, TOLD, which));
	return {
		said:
			`${figure(share, 1, 100)} % of the told calculator ` +
			`(of what is above keeping nothing: ${figure(strict, 1, 100)} %), goal ${least * 100} %`,
		met: share.mean >= least
	};
}
