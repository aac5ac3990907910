import { yearly, type Books } from './books';
import { Calculator } from './calculator';
import { clairvoyant } from './clairvoyant';
import { told } from './knowledge';
import { Learning } from './learning';
import type { Scenario } from './scenario';
import { live } from './shop';
import { KEEP_NOTHING, THUMBS } from './thumb';
import type { TruthName } from './truth';
import { world, type World } from './world';

export interface Asked {
	seeds: readonly number[];
	years: number;
	sellOff: number;
}

/** What one way of deciding made of each seed's world. */
export interface Result {
	name: string;
	/** Dollars a year, level over the years of intake; discounted. */
	money: number[];
	/** The same of what fell from the fourth year on. */
	later: number[];
	/** Bench hours a year. */
	hours: number[];
}

export const LEARNING = 'the calculator';
export const TOLD = 'the calculator, told';
export const BOUND = 'clairvoyant';
const FOURTH_YEAR = 3;

type Way = readonly [name: string, live: (world: World) => Books];

export const LEARNS: Way = [LEARNING, (world) => live(world, new Calculator(new Learning(world)))];
export const IS_TOLD: Way = [TOLD, (world) => live(world, new Calculator(told()))];
export const KNOWS_ALL: Way = [BOUND, clairvoyant];
export const ALL_THUMBS: readonly Way[] = THUMBS.map(({ name, make }) => [
	name,
	(world) => live(world, make())
]);
export const NOTHING: Way = [KEEP_NOTHING.name, (world) => live(world, KEEP_NOTHING.make())];

/** Every way in the same worlds: whatever differs, differs by the rule alone. */
export function compare(
	ways: readonly Way[],
	scenario: Scenario,
	truth: TruthName,
	{ seeds, years, sellOff }: Asked
): Map<string, Result> {
	const results = new Map<string, Result>(
		ways.map(([name]) => [name, { name, money: [], later: [], hours: [] }])
	);
	for (const seed of seeds) {
		const drawn = world({ scenario, truth, seed, years, sellOff });
		for (const [name, run] of ways) {
			const books = run(drawn);
			const result = results.get(name);
			result?.money.push(yearly(books.since(0), 0, years) / 100);
			result?.later.push(yearly(books.since(FOURTH_YEAR), FOURTH_YEAR, years) / 100);
			result?.hours.push(books.minutes / 60 / years);
		}
	}
	return results;
}

export function resultOf(results: ReadonlyMap<string, Result>, name: string): Result {
	const found = results.get(name);
	if (!found) throw new Error(`${name} was not run`);
	return found;
}
