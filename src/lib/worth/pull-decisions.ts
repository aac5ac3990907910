import type { Bound } from './pull-bound';
import type { Question } from './pull-choices';

interface Cost {
	mask: bigint;
	cost: number;
}

/** One decision: which answers before it bear on it, and which stay open after it. */
export interface Decision {
	choice: number;
	self: bigint;
	needs: bigint;
	clashes: bigint;
	/** A no costs this where the choice of the mask was a yes. */
	costIfIn: Cost[];
	/** A no costs this where the choice of the mask was a no. */
	costIfOut: Cost[];
	/** What later decisions still ask for. */
	open: bigint;
}

function partners({ choices, clashes }: Question): Set<number>[] {
	const found = choices.map(() => new Set<number>());
	choices.forEach(({ needs }, at) => {
		for (const need of needs) {
			found[at]!.add(need);
			found[need]!.add(at);
		}
	});
	for (const [one, other] of clashes) {
		found[one]!.add(other);
		found[other]!.add(one);
	}
	return found;
}

/** What is needed first; among those ready the one that leaves the fewest answers open. */
function order(question: Question): { choice: number; open: Set<number> }[] {
	const bears = partners(question);
	const left = new Set(question.choices.keys());
	const openAfter = (open: Set<number>, choice: number) =>
		[...open, choice].filter((each) => [...bears[each]!].some((p) => p !== choice && left.has(p)));
	const steps: { choice: number; open: Set<number> }[] = [];
	let open = new Set<number>();
	while (left.size) {
		let best: { choice: number; open: number[] } | null = null;
		for (const choice of left) {
			if (question.choices[choice]!.needs.some((need) => left.has(need))) continue;
			const then = openAfter(open, choice);
			if (!best || then.length < best.open.length) best = { choice, open: then };
		}
		if (!best) throw new Error('choices that need one another');
		left.delete(best.choice);
		open = new Set(best.open);
		steps.push({ choice: best.choice, open });
	}
	return steps;
}

const bit = (choice: number) => 1n << BigInt(choice);
const bits = (choices: Iterable<number>) =>
	[...choices].reduce((mask, choice) => mask | bit(choice), 0n);

/** The order to decide in, with what each decision has to look at. */
export function decisionOrder(question: Question, bound: Bound): Decision[] {
	const decided = new Set<number>();
	return order(question).map(({ choice, open }) => {
		const { needs } = question.choices[choice]!;
		const clashing = question.clashes.flatMap(([one, other], at) => {
			const rest = one === choice ? other : other === choice ? one : null;
			return rest !== null && decided.has(rest) ? [{ rest, cost: bound.prices[at]! }] : [];
		});
		decided.add(choice);
		return {
			choice,
			self: bit(choice),
			needs: bits(needs),
			clashes: bits(clashing.map(({ rest }) => rest)),
			costIfIn: needs.map((need, at) => ({
				mask: bit(need),
				cost: bound.flow.alongNeeds[choice]![at]!
			})),
			costIfOut: clashing.map(({ rest, cost }) => ({ mask: bit(rest), cost })),
			open: bits(open)
		};
	});
}
