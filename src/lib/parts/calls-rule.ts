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

const sum = (a: CallsCount, b: CallsCount): CallsCount => ({
	calls: a.calls + b.calls,
	years: a.years + b.years
});

function add(sums: Map<string, CallsCount>, key: string, calls: number, years: number): void {
	sums.set(key, sum(sums.get(key) ?? NONE, { calls, years }));
}

interface Tally {
	/** In calls as usual: all of them by '', and each kind. */
	shop: Map<string, CallsCount>;
	/** In years of an ordinary engine. */
	kinds: Map<string, CallsCount>;
	engines: Map<string, CallsRow[]>;
	rows: Map<string, CallsRow>;
}

function tallied(seen: readonly CallsRow[], { usual, mark }: CallsBelief): Tally {
	const [shop, kinds] = [new Map<string, CallsCount>(), new Map<string, CallsCount>()];
	const [engines, rows] = [new Map<string, CallsRow[]>(), new Map<string, CallsRow>()];
	for (const row of seen) {
		const years = row.years * mark(row.engine);
		for (const key of ['', row.kind]) add(shop, key, row.calls, years * usual(row.kind));
		add(kinds, row.kind, row.calls, years);
		if (row.engine === '') continue;
		rows.set(`${row.kind} ${row.engine}`, row);
		const on = engines.get(row.engine);
		if (on) on.push(row);
		else engines.set(row.engine, [row]);
	}
	return { shop, kinds, engines, rows };
}

/** The shop by all other kinds, then the kind by all engines but that of its own row. */
function ofKind(
	{ shop, kinds }: Tally,
	{ usual, mark, worth }: CallsBelief,
	kind: string,
	own?: CallsRow
): Pick<CallsSteps, 'shop' | 'others'> {
	const rest = without(shop.get(''), shop.get(kind));
	const times = learned(1, worth, rest);
	const here = own && { calls: own.calls, years: own.years * mark(own.engine) };
	const others = without(kinds.get(kind), here);
	const believed = usual(kind) * times;
	const mean = learned(believed, worth, others);
	return { shop: { ...rest, times }, others: { ...others, believed, mean } };
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
export function callsRule(seen: readonly CallsRow[], belief: CallsBelief) {
	const { worth } = belief;
	const tally = tallied(seen, belief);
	const [kinds, engines] = [once<ReturnType<typeof ofKind>>(), once<CallsCount>()];
	const kindFor = (kind: string, own?: CallsRow) =>
		kinds(`${kind} ${own?.engine ?? ''}`, () => ofKind(tally, belief, kind, own));
	const inCalls = (row: CallsRow): CallsCount => ({
		calls: row.calls,
		years: row.years * kindFor(row.kind, row).others.mean
	});
	const onEngine = (engine: string) =>
		engines(engine, () => (tally.engines.get(engine) ?? []).map(inCalls).reduce(sum, NONE));

	return (kind: string, engine: string, mark: number): CallsSteps => {
		const own = tally.rows.get(`${kind} ${engine}`);
		const { shop, others } = kindFor(kind, own);
		const rest = without(onEngine(engine), own && inCalls(own));
		const times = learned(mark, worth, rest);
		const believed = others.mean * times;
		const seen = own ? { calls: own.calls, years: own.years } : NONE;
		const mean = learned(believed, worth, seen);
		return { shop, others, engine: { ...rest, times }, own: seen, believed, mean };
	};
}
