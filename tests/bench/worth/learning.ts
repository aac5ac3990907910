import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Kind, Level } from '$lib/trade';
import { learnChance, learnShare } from '$lib/worth';
import { shareOf } from './asking';
import type { Knowledge } from './knowledge';
import { LearnedCalls } from './learned-calls';
import type { Item } from './market';
import type { World } from './world';

const WORTH = { tests: 4, comeBacks: 20, sales: 5 };

interface Tally {
	yes: number;
	no: number;
}

interface Sums {
	count: number;
	sum: number;
	squares: number;
}

const SALES_AT_A_TIME = 10;

function inShort({ count, sum, squares }: Sums) {
	const mean = sum / count;
	return { count, mean, spread: Math.sqrt(Math.max(0, squares / count - mean ** 2)) };
}

const count = (tallies: Map<string, Tally>, key: string, yes: boolean) => {
	const tally = tallies.get(key) ?? { yes: 0, no: 0 };
	tally[yes ? 'yes' : 'no']++;
	tallies.set(key, tally);
};

function learned(prior: { mean: number; worth: number }, tally: Tally | undefined): number {
	if (!tally) return prior.mean;
	return learnChance({ prior, observations: { successes: tally.yes, failures: tally.no } }).mean;
}

/** Starts from the defaults and learns from what comes. */
export class Learning implements Knowledge {
	private readonly tests = new Map<string, Tally>();
	private readonly backs = new Map<string, Tally>();
	private readonly paid = new Map<Level, Sums>();
	private readonly shares = new Map<Level, number>();
	private readonly calling: LearnedCalls;
	private readonly chances = new Map<string, number>();

	constructor({ families, scenario }: Pick<World, 'families' | 'scenario'>) {
		this.calling = new LearnedCalls(families, scenario.calendar);
	}

	calls = (item: Item, at: number) => this.calling.perYear(item, at);
	called = (item: Item) => this.calling.called(item);

	chance({ kind }: Item, level: Level): number {
		const key = `${kind.id}/${level}`;
		const found = this.chances.get(key);
		if (found !== undefined) return found;
		const prior = { mean: DEFAULT_POLICY.chances[level], worth: WORTH.tests };
		const mean = learned(prior, this.tests.get(key));
		this.chances.set(key, mean);
		return mean;
	}

	comeBack({ id, comeBack }: Kind): number {
		const found = this.chances.get(id);
		if (found !== undefined) return found;
		const mean = learned({ mean: comeBack, worth: WORTH.comeBacks }, this.backs.get(id));
		this.chances.set(id, mean);
		return mean;
	}

	price(item: Item, level: Level): number {
		const share = this.shares.get(level);
		if (share === undefined) return item.usedCents[level];
		return Math.min(share * item.newCents, item.capCents);
	}

	tested({ kind }: Item, level: Level, passed: boolean): void {
		const key = `${kind.id}/${level}`;
		count(this.tests, key, passed);
		this.chances.delete(key);
	}

	sold(item: Item, level: Level, paidCents: number, cameBack: boolean): void {
		count(this.backs, item.kind.id, cameBack);
		this.chances.delete(item.kind.id);
		if (item.usedCents[level] >= item.capCents * 0.9) return;
		const sums = this.paid.get(level) ?? { count: 0, sum: 0, squares: 0 };
		this.paid.set(level, sums);
		const share = Math.min(1, paidCents / item.newCents);
		sums.count++;
		sums.sum += share;
		sums.squares += share ** 2;
		if (sums.count % SALES_AT_A_TIME !== 0) return;
		const prior = { mean: shareOf(level), worth: WORTH.sales };
		this.shares.set(level, learnShare({ prior, observations: inShort(sums) }).mean);
	}
}
