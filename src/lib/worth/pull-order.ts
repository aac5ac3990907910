import { closureSolver } from './closure-flow';
import type { Donor, Haul } from './pull-donor';

interface Piece {
	minutes: number;
	cents: number;
}

// a moment for each, so that what takes no time can be divided by it
const MOMENT = 1e-9;

function pieceOf(part: number, { kept }: Haul, donor: Donor): Piece {
	const off = donor.minutes[part]!;
	const keep = kept.has(part);
	return {
		minutes: off + (keep ? donor.keepMinutes[part]! : 0),
		cents: (keep ? donor.net[part]! : 0) - donor.labour * off
	};
}

const perMinute = (pieces: Iterable<Piece>) => {
	let cents = 0;
	let minutes = MOMENT;
	for (const piece of pieces) {
		cents += piece.cents;
		minutes += piece.minutes;
	}
	return cents / minutes;
};

/** Of what is left, the closed set that brings most per minute: raises the rate until none beats it. */
function best(left: readonly number[], pieces: Map<number, Piece>, donor: Donor): number[] {
	const at = new Map(left.map((part, index) => [part, index]));
	const needs = left.map((part) =>
		donor.needs[part]!.flatMap((need) => (at.has(need) ? [at.get(need)!] : []))
	);
	const solve = closureSolver(needs);
	const rateOf = (parts: readonly number[]) => perMinute(parts.map((part) => pieces.get(part)!));
	let block = [...left];
	for (;;) {
		const rate = rateOf(block);
		const { chosen } = solve(
			Float64Array.from(left, (part) => {
				const { cents, minutes } = pieces.get(part)!;
				return cents - rate * (minutes + MOMENT / left.length);
			})
		);
		const next = left.filter((_part, index) => chosen[index]);
		if (!next.length || rateOf(next) <= rate * (1 + 1e-12) + 1e-12) return block;
		block = next;
	}
}

/** The first to come off of what a part still waits for, the part itself at last. */
function firstOf(part: number, left: ReadonlySet<number>, donor: Donor): number {
	const waits = [...donor.closures[part]!].filter((each) => each !== part && left.has(each));
	const outside = waits.find((each) => !donor.closures[each]!.has(part));
	const next = outside ?? waits[0];
	if (next === undefined) return part;
	// parts that wait for one another: nothing else is left before them, so any of them may begin
	return outside === undefined ? next : firstOf(next, left, donor);
}

/** Inside a block step by step, toward what then brings most per minute. */
function walk(block: readonly number[], pieces: Map<number, Piece>, donor: Donor): number[] {
	const left = new Set(block);
	const steps: number[] = [];
	const rate = (part: number) =>
		perMinute(
			[...donor.closures[part]!].filter((each) => left.has(each)).map((each) => pieces.get(each)!)
		);
	while (left.size) {
		const ranked = [...left].map((part) => ({ part, rate: rate(part) }));
		const target = ranked.reduce((a, b) => (b.rate > a.rate ? b : a)).part;
		const step = firstOf(target, left, donor);
		left.delete(step);
		steps.push(step);
	}
	return steps;
}

/**
 * The order to work in: what stands before a part comes before it, and the best total per minute
 * comes first, a part that only gives access counted with what it opens.
 * Source: Sidney 1975, "Decomposition Algorithms for Single-Machine Sequencing with Precedence
 * Relations and Deferral Costs".
 */
export function workOrder(haul: Haul, donor: Donor): number[] {
	const pieces = new Map([...haul.off].map((part) => [part, pieceOf(part, haul, donor)]));
	let left = [...haul.off].sort((a, b) => a - b);
	const steps: number[] = [];
	while (left.length) {
		const block = best(left, pieces, donor);
		steps.push(...walk(block, pieces, donor));
		const done = new Set(block);
		left = left.filter((part) => !done.has(part));
	}
	return steps;
}
