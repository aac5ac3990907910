import { closureSolver, type ClosureFlow } from './closure-flow';
import type { Question } from './pull-choices';

/** A proof of how good the answer can be at most, and what each yes or no costs of that. */
export interface Bound {
	most: number;
	flow: ClosureFlow;
	/** Price of a minute. */
	minute: number;
	/** Cost, for each clash, of leaving both out. */
	prices: Float64Array;
}

const HALVINGS = 24;
const STEPS = 60;
// how often a set on the way is tried out
const LOOKS = 6;

/** Bound with a price on each minute and on each clash: any prices of nil or more give one. */
function bounder(question: Question, limit: number) {
	const { choices, clashes } = question;
	const solve = closureSolver(choices.map(({ needs }) => needs));
	return (minute: number, prices: Float64Array): Bound => {
		const profits = Float64Array.from(choices, (each) => each.cents - minute * each.minutes);
		let most = minute === 0 ? 0 : minute * limit;
		clashes.forEach(([one, other], at) => {
			profits[one]! -= prices[at]!;
			profits[other]! -= prices[at]!;
			most += prices[at]!;
		});
		const flow = solve(profits);
		return { most: most + flow.best, flow, minute, prices };
	};
}

function minutesOf({ flow }: Bound, { choices }: Question): number {
	return choices.reduce((sum, each, at) => (flow.chosen[at] ? sum + each.minutes : sum), 0);
}

/**
 * The tightest bound found: first the price of a minute by halving, then all prices by following the
 * slope. `seen` is shown every closed set on the way and answers the best sum that is possible so far.
 * Source: Fisher 1981, "The Lagrangian Relaxation Method for Solving Integer Programming Problems".
 */
export function tightBound(
	question: Question,
	limit: number,
	seen: (chosen: readonly boolean[]) => number
): Bound {
	const at = bounder(question, limit);
	const free = new Float64Array(question.clashes.length);
	let best = at(0, free);
	let possible = seen(best.flow.chosen);
	const take = (bound: Bound, turn: number) => {
		if (turn % LOOKS === 0) possible = seen(bound.flow.chosen);
		if (bound.most < best.most) best = bound;
	};
	let low = 0;
	if (minutesOf(best, question) > limit) {
		let high = 1;
		while (minutesOf(at(high, free), question) > limit) high *= 2;
		for (let turn = 0; turn < HALVINGS && best.most - possible > 1e-6; turn += 1) {
			const minute = (low + high) / 2;
			const bound = at(minute, free);
			take(bound, turn);
			if (minutesOf(bound, question) > limit) low = minute;
			else high = minute;
		}
		low = high;
	}
	if (!question.clashes.length) return best;
	let minute = low;
	let prices = free;
	for (let turn = 0; turn < STEPS && best.most - possible > 1e-6; turn += 1) {
		const bound = at(minute, prices);
		take(bound, turn);
		const { chosen } = bound.flow;
		const spare = minute === 0 && limit === Infinity ? 0 : limit - minutesOf(bound, question);
		const slopes = question.clashes.map(([a, b]) => 1 - Number(chosen[a]) - Number(chosen[b]));
		// minutes are counted in tens here, or their slope would drown the others
		const size = slopes.reduce((sum, slope) => sum + slope * slope, (spare / 10) ** 2);
		if (size === 0) break;
		const step = (0.95 ** turn * (bound.most - possible)) / size;
		minute = Math.max(0, minute - (step * spare) / 100);
		prices = Float64Array.from(prices, (price, clash) =>
			Math.max(0, price - step * slopes[clash]!)
		);
	}
	return best;
}
