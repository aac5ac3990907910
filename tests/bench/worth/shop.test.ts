import { describe, expect, it } from 'vitest';
import { assign } from './assignment';
import { Calculator } from './calculator';
import { clairvoyant } from './clairvoyant';
import { ratio, studentT } from './intervals';
import { defaults, told } from './knowledge';
import { Learning } from './learning';
import type { Item } from './market';
import type { Rule } from './rule';
import { SCENARIOS, type Scenario } from './scenario';
import { live } from './shop';
import { ALL_YEAR, SNOW, watched } from './season';
import { KEEP_NOTHING, thumb } from './thumb';
import { world, type World } from './world';

const [slow] = SCENARIOS;
if (!slow) throw new Error('no scenario');
// so little room that every rule has to drop some
const scenario: Scenario = { ...slow, places: { s: 40, m: 25, l: 8, xl: 2 } };
const draw = (seed: number): World =>
	world({ scenario, truth: 'calls and chances mixed', seed, years: 1, sellOff: 1 });
const one = draw(1);

const rules: [string, (of: World) => Rule][] = [
	['keep everything', () => thumb(() => true)],
	['clean everything', () => thumb(() => true, true)],
	['learning', (of) => new Calculator(new Learning(of))],
	['told', () => new Calculator(told())]
];

describe('the simulated shop', () => {
	it.each(rules)('loses no part: %s', (_, make) => {
		const { fates, logged } = live(one, make(one));
		expect(Object.values(fates).reduce((sum, count) => sum + count, 0)).toBe(logged);
		expect(logged).toBeGreaterThan(20);
		expect(fates.sold).toBeGreaterThan(5);
		expect(fates.failed).toBeGreaterThan(0);
	});

	it('comes out the same from the same seed, and not from another', () => {
		const money = (of: World) => live(of, new Calculator(new Learning(of))).years;
		expect(money(draw(1))).toEqual(money(one));
		expect(money(draw(2))).not.toEqual(money(one));
	});

	it('earns nothing but scrap where nothing is kept', () => {
		const books = live(one, KEEP_NOTHING.make());
		expect(books.logged).toBe(0);
		expect(books.minutes).toBe(0);
		expect(books.scrapCents).toBeGreaterThan(0);
		expect(books.since(0)).toBeCloseTo(books.scrapCents, 6);
	});

	it('never has more on the shelf than there is room for', () => {
		const everything = thumb(() => true);
		const seen: number[] = [];
		live(one, {
			...everything,
			keep: (donor, alive, moment) => {
				seen.push(moment.shelf.ofSize('xl').size);
				return everything.keep(donor, alive, moment);
			}
		});
		expect(Math.max(...seen)).toBe(scenario.places.xl);
	});

	it('has no rule that makes more than the one who knows all', () => {
		const bound = clairvoyant(one).since(0);
		for (const [, make] of rules) expect(live(one, make(one)).since(0)).toBeLessThan(bound);
	});

	it('lets the calculator learn the calls that come, where the defaults say a third of them', () => {
		const busier = world({ ...one, truth: 'three times the calls', years: 3 });
		const end = busier.years + busier.sellOff;
		const learning = new Learning(busier);
		const items = busier.families.flatMap((family) => family.items);
		const sum = (calls: (item: Item) => number) =>
			items.reduce((total, item) => total + calls(item), 0);
		live(busier, new Calculator(learning));
		const truth = sum((item) => item.trueCalls);
		expect(sum((item) => defaults().calls(item, end)) / truth).toBeCloseTo(1 / 3, 6);
		expect(sum((item) => learning.calls(item, end)) / truth).toBeGreaterThan(0.8);
		expect(sum((item) => learning.calls(item, end)) / truth).toBeLessThan(1.2);
	});
});

describe('its tools', () => {
	it('counts the time watched by the calls that it brings: a year is one, a winter most of it', () => {
		for (const calendar of [ALL_YEAR, SNOW]) {
			expect(watched(3, calendar)).toBeCloseTo(3, 9);
			expect(watched(0, calendar)).toBe(0);
		}
		expect(watched(2.5, SNOW) - 2).toBeLessThan(0.4);
		expect(watched(2.5, SNOW)).toBeLessThan(watched(2.51, SNOW));
		const month = watched(4 / 52, SNOW);
		expect(month).toBeCloseTo((4 * SNOW.calls[0]!) / 52, 9);
	});

	it('assigns for the greatest sum, as trying all ways does', () => {
		const weights = [
			[4, 9, 0],
			[7, 8, 2],
			[0, 6, 5],
			[3, 3, 3]
		];
		const all = (row: number, left: number[]): number => {
			const line = weights[row];
			if (!line) return 0;
			const ways = left.map(
				(at) =>
					(line[at] ?? 0) +
					all(
						row + 1,
						left.filter((o) => o !== at)
					)
			);
			return Math.max(all(row + 1, left), ...ways);
		};
		const taken = assign(weights);
		const sum = taken.reduce((total, at, row) => total + (weights[row]?.[at] ?? 0), 0);
		expect(sum).toBe(all(0, [0, 1, 2]));
		expect(new Set(taken.filter((at) => at >= 0)).size).toBe(taken.filter((at) => at >= 0).length);
	});

	it("knows Student's t, and a ratio that is the same for every seed", () => {
		expect(studentT(5)).toBeCloseTo(2.571, 2);
		expect(studentT(30)).toBeCloseTo(2.042, 3);
		const same = ratio([2, 4, 6], [1, 2, 3]);
		expect(same.mean).toBe(2);
		expect(same.half).toBeCloseTo(0, 12);
	});
});
