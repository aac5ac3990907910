import type { Bound } from './pull-bound';
import type { Question } from './pull-choices';
import { decisionOrder } from './pull-decisions';

/** One way to have decided so far; a chain back to the start. */
interface Way {
	minutes: number;
	cents: number;
	before: Way | null;
	yes: number | null;
}

/**
 * All ways that leave the same open: the better ones, by minutes and by cents rising. What a way has
 * lost against the bound is `sum` less its cents, its minutes at their price added: the same sum for
 * every way that leaves the same open.
 */
interface Cell {
	sum: number;
	ways: Way[];
}

// sums less than this apart, in cents, are the same
const SAME = 1e-6;

// fewer minutes first; what brings no more than a shorter way is dropped
function merged(one: readonly Way[], other: readonly Way[]): Way[] {
	const all: Way[] = [];
	let a = 0;
	let b = 0;
	while (a < one.length || b < other.length) {
		const first = one[a];
		const second = other[b];
		const takeFirst =
			!second ||
			(first !== undefined &&
				(first.minutes < second.minutes ||
					(first.minutes === second.minutes && first.cents >= second.cents)));
		const way = takeFirst ? first! : second;
		if (takeFirst) a += 1;
		else b += 1;
		if (!all.length || way.cents > all[all.length - 1]!.cents) all.push(way);
	}
	return all;
}

function put(cells: Map<bigint, Cell>, key: bigint, cell: Cell): void {
	const there = cells.get(key);
	if (there) there.ways = merged(there.ways, cell.ways);
	else if (cell.ways.length) cells.set(key, cell);
}

/**
 * The best answer, exactly: decides one choice after the other, keeps for each set of answers that
 * still matters the ways that none beats in both minutes and cents, and drops what the bound proves
 * to end below a floor. In: the question, the minutes, the bound, the floor in cents. Out: the parts
 * to keep, of equal sums those of fewer minutes; null where nothing reaches the floor. With a `width`
 * it follows only that many sets of answers, the most promising: quick, and not sure to be the best.
 */
export function bestKept(
	question: Question,
	limit: number,
	bound: Bound,
	floor: number,
	width = Infinity
): number[] | null {
	const { choices } = question;
	const slack = bound.most - floor + SAME;
	let cells = new Map<bigint, Cell>([
		[0n, { sum: 0, ways: [{ minutes: 0, cents: 0, before: null, yes: null }] }]
	]);
	for (const step of decisionOrder(question, bound)) {
		const { cents, minutes } = choices[step.choice]!;
		const after = new Map<bigint, Cell>();
		const within = (sum: number, ways: Way[]): Cell => {
			const lost = (way: Way) => sum - way.cents + bound.minute * way.minutes;
			return { sum, ways: ways.filter((way) => way.minutes <= limit && lost(way) <= slack) };
		};
		for (const [key, { sum, ways }] of cells) {
			let no = sum + bound.flow.costOut[step.choice]!;
			for (const { mask, cost } of step.costIfIn) if (key & mask) no += cost;
			for (const { mask, cost } of step.costIfOut) if (!(key & mask)) no += cost;
			put(after, key & step.open, within(no, ways));
			if ((key & step.needs) !== step.needs || key & step.clashes) continue;
			const yes = sum + bound.flow.costIn[step.choice]! + cents - bound.minute * minutes;
			const longer = ways.map((way) => ({
				minutes: way.minutes + minutes,
				cents: way.cents + cents,
				before: way,
				yes: step.choice
			}));
			put(after, (key | step.self) & step.open, within(yes, longer));
		}
		cells = after.size > width ? promising(after, width, bound) : after;
	}
	const ways = [...cells.values()].flatMap((cell) => cell.ways);
	const most = Math.max(...ways.map((way) => way.cents));
	const best = ways.find((way) => way.cents >= most - SAME);
	return best && most >= floor - SAME ? keptOn(best, question) : null;
}

function promising(cells: Map<bigint, Cell>, width: number, { minute }: Bound): Map<bigint, Cell> {
	const lost = ({ sum, ways }: Cell) =>
		ways.reduce((least, way) => Math.min(least, sum - way.cents + minute * way.minutes), Infinity);
	const ranked = [...cells].map(([key, cell]) => ({ key, cell, lost: lost(cell) }));
	ranked.sort((a, b) => a.lost - b.lost);
	return new Map(ranked.slice(0, width).map(({ key, cell }) => [key, cell]));
}

function keptOn(last: Way, { choices }: Question): number[] {
	const kept: number[] = [];
	for (let way: Way | null = last; way; way = way.before) {
		const part = way.yes === null ? null : choices[way.yes]!.keeps;
		if (part !== null) kept.push(part);
	}
	return kept;
}
