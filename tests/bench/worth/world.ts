import { CAUSES, chanceLevel, type CauseId, type Level } from '$lib/trade';
import { arrivals } from './arrivals';
import { market, type Family, type Item } from './market';
import { draws, type Draws } from './random';
import type { Scenario } from './scenario';
import type { TruthName } from './truth';

/** A part with its fate. Times in years from the start. */
export interface BenchPart {
	item: Item;
	level: Level;
	good: boolean;
	comesBack: boolean;
	diesAt: number;
}

export interface Donor {
	at: number;
	family: Family;
	/** What may be kept of it; the rest only stands before something. */
	parts: readonly BenchPart[];
}

export interface Call {
	at: number;
	item: Item;
	/** Times the usual price that this one pays. */
	pays: number;
	/** Unanswered, it stays open until then... */
	openUntil: number;
	/** ...and takes the part that comes in, or not. */
	takes: boolean;
}

export interface World {
	scenario: Scenario;
	seed: number;
	years: number;
	sellOff: number;
	families: readonly Family[];
	donors: readonly Donor[];
	calls: readonly Call[];
}

export interface WorldAsked {
	scenario: Scenario;
	truth: TruthName;
	seed: number;
	/** Years in which donors come in. */
	years: number;
	/** Years in which the shelf that is left still answers calls. */
	sellOff: number;
}

// how often an engine dies of what, invented
const OFTEN: Partial<Record<CauseId, number>> = {
	'stale-fuel': 4,
	'no-oil': 3,
	worn: 3,
	retired: 2,
	strike: 2,
	'thrown-rod': 2,
	unknown: 2
};
const WEIGHTED = CAUSES.map(({ id }) => [id, OFTEN[id] ?? 1] as const);

const WANT_YEARS = 30 / 365;
const WANT_TAKES = 0.7;

function makeDonor(at: number, families: readonly Family[], from: Draws): Donor {
	const family = from.pick(families);
	const cause = from.weighted(WEIGHTED);
	const parts = family.items.map((item): BenchPart => {
		const level = chanceLevel(item.kind.id, cause);
		const good = from.next() < item.trueChance[level];
		const comesBack = from.next() < item.kind.comeBack;
		return { item, level, good, comesBack, diesAt: at + from.exponential(item.dyingRate) };
	});
	const mayBeKept = ({ item, level }: BenchPart) =>
		item.kind.reuse !== 'never' && level !== 'ruined';
	return { at, family, parts: parts.filter(mayBeKept) };
}

function callsFor(item: Item, until: number, asked: WorldAsked): Call[] {
	const from = draws(asked.seed, asked.scenario.name, 'calls', item.at);
	return arrivals(item.trueCalls, until, asked.scenario, from).map((at) => ({
		at,
		item,
		pays: Math.exp(0.15 * from.normal() - 0.01125),
		openUntil: at + from.exponential(1 / WANT_YEARS),
		takes: from.next() < WANT_TAKES
	}));
}

/** Everything that will happen, drawn before any rule decides: each rule meets the same fate. */
export function world(asked: WorldAsked): World {
	const { scenario, truth, seed, years, sellOff } = asked;
	const families = market(scenario, truth, seed);
	const donorsAt = arrivals(scenario.donorsPerYear, years, scenario, draws(seed, 'arrivals'));
	return {
		scenario,
		seed,
		years,
		sellOff,
		families,
		donors: donorsAt.map((at, n) =>
			makeDonor(at, families, draws(seed, scenario.name, 'donor', n))
		),
		calls: families
			.flatMap(({ items }) => items)
			.flatMap((item) => callsFor(item, years + sellOff, asked))
			.sort((a, b) => a.at - b.at || a.item.at - b.item.at)
	};
}
