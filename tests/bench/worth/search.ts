import type { Level } from '$lib/trade';
import { above } from './report';
import { compare, LEARNS, NOTHING, resultOf, LEARNING, type Asked } from './results';
import { estimate } from './intervals';
import type { Scenario } from './scenario';
import { live } from './shop';
import { thumb } from './thumb';
import type { TruthName } from './truth';
import { world, type World } from './world';

/** A rule by thresholds: from which price, which grade, which calls a year, and which kinds not. */
export interface Thresholds {
	leastCents: number;
	grades: readonly Level[];
	leastCalls: number;
	without: ReadonlySet<string>;
}

const PRICES = [0, 10, 15, 20, 25, 30, 40, 50, 60, 80, 100, 130, 160, 200];
const GRADES: readonly (readonly Level[])[] = [
	['high', 'medium', 'low'],
	['high', 'medium'],
	['high']
];
const CALLS = [0, 0.3, 0.4, 0.5, 0.6, 0.8, 1];

export const byThresholds = ({ leastCents, grades, leastCalls, without }: Thresholds) =>
	thumb(
		({ item, level }) =>
			item.usedCents[level] >= leastCents &&
			grades.includes(level) &&
			item.kind.callsPerYear >= leastCalls &&
			!without.has(item.kind.id)
	);

const money = (worlds: readonly World[], rule: Thresholds): number =>
	worlds.reduce((sum, each) => sum + live(each, byThresholds(rule)).since(0), 0);

function grid(worlds: readonly World[]): { rule: Thresholds; cents: number } {
	let best = { rule: undefined as Thresholds | undefined, cents: -Infinity };
	for (const dollars of PRICES)
		for (const grades of GRADES)
			for (const leastCalls of CALLS) {
				const rule = { leastCents: dollars * 100, grades, leastCalls, without: new Set<string>() };
				const cents = money(worlds, rule);
				if (cents > best.cents) best = { rule, cents };
			}
	if (!best.rule) throw new Error('no thresholds were tried');
	return { rule: best.rule, cents: best.cents };
}

/** The best thresholds of the grid, then each kind left out for good where that brings more. */
export function bestThresholds(worlds: readonly World[]): Thresholds {
	let { rule, cents } = grid(worlds);
	const kinds = new Set(
		worlds.flatMap(({ families }) => families.flatMap(({ items }) => items.map((i) => i.kind.id)))
	);
	for (const id of kinds) {
		const other = { ...rule, without: new Set([...rule.without, id]) };
		const found = money(worlds, other);
		if (found > cents) [rule, cents] = [other, found];
	}
	return rule;
}

/** Searched on the very seeds that it is then held against: all the luck is on its side. */
export function searched(scenario: Scenario, truth: TruthName, asked: Asked): string {
	const { seeds, years, sellOff } = asked;
	const rule = bestThresholds(
		seeds.map((seed) => world({ scenario, truth, seed, years, sellOff }))
	);
	const results = compare(
		[LEARNS, NOTHING, ['thresholds', (each) => live(each, byThresholds(rule))]],
		scenario,
		truth,
		asked
	);
	const own = resultOf(results, LEARNING).money;
	const ahead = estimate(
		own.map((value, at) => value - (resultOf(results, 'thresholds').money[at] ?? 0))
	);
	const earned = estimate(above(results, 'thresholds'));
	return (
		`best thresholds: from $ ${rule.leastCents / 100}, grades ${rule.grades.join(' ')}, ` +
		`from ${rule.leastCalls} calls, without ${rule.without.size} kinds; ` +
		`$ ${earned.mean.toFixed(0)} a year above keeping nothing. ` +
		`The calculator is ahead by $ ${ahead.mean.toFixed(0)} ± ${ahead.half.toFixed(0)}: ` +
		(ahead.mean > 0 ? 'not beaten' : 'BEATEN')
	);
}
