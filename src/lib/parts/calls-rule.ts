import { once } from './learn-once';

/** Calls that came, and how many came of one a year (or one as believed) while it was watched. */
export interface CallsCount {
	calls: number;
	years: number;
}
export interface CallsRow extends CallsCount {
	kind: string;
	/** '' is one that is not known. */
	engine: string;
}

export interface CallsBelief {
	/** Calls a year for a kind on an ordinary engine. */
	usual: (kind: string) => number;
	/** Times an ordinary engine that this one is asked for. */
	mark: (engine: string) => number;
	/** Calls that a belief is worth, at every step. */
	worth: number;
}

/** What each step saw, less what a later one counts, and what it made of it. */
export interface CallsSteps {
	/** All other kinds; years in calls as usual. */
	shop: CallsCount & { times: number };
	/** The kind on all other engines; years in those of an ordinary engine. */
	others: CallsCount & { believed: number; mean: number };
	/** The other kinds on this engine; years in calls on an ordinary engine. */
	engine: CallsCount & { times: number };
	own: CallsCount;
	/** Calls a year before and after the part's own are counted. */
	believed: number;
	mean: number;
}

export const isSeen = ({ calls, years }: CallsCount): boolean => calls + years > 0;

const NONE: CallsCount = { calls: 0, years: 0 };
const ROUNDING = 1e-9;

/** The weights of a Gamma for `mean` calls a year; where nobody calls, none in that many years. */
export const gammaWorth = (mean: number, worth: number) =>
	mean === 0 ? { shape: 0, years: worth } : { shape: worth, years: worth / mean };

function learned(believed: number, worth: number, seen: CallsCount): number {
	if (!isSeen(seen)) return believed;
	const { shape, years } = gammaWorth(believed, worth);
	return (shape + seen.calls) / (years + seen.years);
}

function without(all: CallsCount = NONE, part: CallsCount = NONE): CallsCount {
	const years = all.years - part.years;
	return { calls: all.calls - part.calls, years: years < ROUNDING ? 0 : years };
}

function add<Key>(sums: Map<Key, CallsCount>, key: Key, calls: number, years: number): void {
	const found = sums.get(key) ?? NONE;
	sums.set(key, { calls: found.calls + calls, years: found.years + years });
}

/**
 * Calls a year for a kind on an engine, in four steps so that each call is counted once: the shop
 * over all other kinds, the kind over all other engines, the engine over its other kinds, then the
 * part's own. In: rows of calls and the years in which one could be seen, a part of the year
 * counted by how many calls it usually brings (mean 1 over the year); the beliefs; `mark` of the
 * engine asked for. Out: the steps. A step that saw n calls moves a figure at most n / (n + worth)
 * of the way up; without rows the usual figure comes back to the letter. Each step is the mean of a
 * Gamma. Source: Gelman and others 2013, "Bayesian Data Analysis", section 2.6.
 */
export function callsRule(rows: readonly CallsRow[], { usual, mark, worth }: CallsBelief) {
	const shop = new Map<string, CallsCount>();
	const kinds = new Map<string, CallsCount>();
	const engines = new Map<string, CallsRow[]>();
	const known = new Map<string, CallsRow>();
	for (const row of rows) {
		const marked = row.years * mark(row.engine);
		for (const key of ['', row.kind]) add(shop, key, row.calls, marked * usual(row.kind));
		add(kinds, row.kind, row.calls, marked);
		if (row.engine === '') continue;
		known.set(`${row.kind} ${row.engine}`, row);
		const on = engines.get(row.engine);
		if (on) on.push(row);
		else engines.set(row.engine, [row]);
	}

	function ofKind(kind: string, own: CallsRow | undefined) {
		const rest = without(shop.get(''), shop.get(kind));
		const times = learned(1, worth, rest);
		const here = own && { calls: own.calls, years: own.years * mark(own.engine) };
		const others = without(kinds.get(kind), here);
		const believed = usual(kind) * times;
		const mean = learned(believed, worth, others);
		return { shop: { ...rest, times }, others: { ...others, believed, mean } };
	}
	const keepKinds = once<ReturnType<typeof ofKind>>();
	const kindOn = (kind: string, own: CallsRow | undefined) =>
		keepKinds(`${kind} ${own?.engine ?? ''}`, () => ofKind(kind, own));

	const keepEngines = once<CallsCount>();
	const onEngine = (engine: string) =>
		keepEngines(engine, () =>
			(engines.get(engine) ?? []).reduce(
				(sum, row) => ({
					calls: sum.calls + row.calls,
					years: sum.years + row.years * kindOn(row.kind, row).others.mean
				}),
				NONE
			)
		);

	return (kind: string, engine: string, marked: number): CallsSteps => {
		const row = known.get(`${kind} ${engine}`);
		const { shop, others } = kindOn(kind, row);
		const here = row && { calls: row.calls, years: row.years * others.mean };
		const rest = without(onEngine(engine), here);
		const times = learned(marked, worth, rest);
		const believed = others.mean * times;
		const own = row ? { calls: row.calls, years: row.years } : NONE;
		const mean = learned(believed, worth, own);
		return { shop, others, engine: { ...rest, times }, own, believed, mean };
	};
}
