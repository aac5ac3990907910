import { FAMILY_FACTOR, type FamilyMark, type Policy } from '$lib/people/policy';
import { learnRate } from '$lib/worth';
import {
	callsRule,
	gammaWorth,
	isSeen,
	type CallsCount,
	type CallsRow,
	type CallsSteps
} from './calls-rule';
import { figuresOf } from './kind-figures';
import { once, unmoved } from './learn-once';
import type { CallsFigure, CallsSeen, Observed, Taught } from './learned-view';

/** By the last step that saw something of the kind itself. */
function between(steps: CallsSteps, worth: number) {
	const { own, others, engine, believed } = steps;
	const last = (mean: number, { calls, years }: CallsCount, times: number) => {
		const observations = { calls, years };
		const { low, high } = learnRate({ prior: gammaWorth(mean, worth), observations });
		return { low: low * times, high: high * times };
	};
	if (isSeen(own) || !isSeen(others)) return last(believed, own, 1);
	return last(others.believed, others, engine.times);
}

/** What was taken while one stood ready and what was asked for while none did, one row for each kind and engine. */
function together(seen: readonly CallsSeen[]): CallsRow[] {
	const rows = new Map<string, CallsRow>();
	for (const { kind, engineKey: engine, calls, years } of seen) {
		const key = `${kind} ${engine}`;
		const row = rows.get(key) ?? { kind, engine, calls: 0, years: 0 };
		rows.set(key, { ...row, calls: row.calls + calls, years: row.years + years });
	}
	return [...rows.values()];
}

/** What the history makes of calls; the rule is callsRule, each year of watching like any other. */
export function calls({ calls: seen, asked }: Observed, policy: Policy): Taught['calls'] {
	const worth = policy.priors.calls;
	const usuals = once<number>();
	const usual = (kind: string) => usuals(kind, () => figuresOf(kind, policy).callsPerYear);
	const mark = (engine: string) => FAMILY_FACTOR[policy.families[engine] ?? 'some'];
	const vain = asked.map(({ sought, wanted, ...row }) => ({
		...row,
		calls: sought * policy.askedWorth + wanted
	}));
	const rows = together([...seen, ...vain]);
	const steps = callsRule(rows, { usual, mark, worth });
	const keep = once<CallsFigure>();
	const work = (kind: string, engineKey: string, family: FamilyMark): CallsFigure => {
		const found = steps(kind, engineKey, FAMILY_FACTOR[family]);
		const { shop, others, engine, own, mean } = found;
		const usually = usual(kind) * FAMILY_FACTOR[family];
		// nothing was seen; or nobody calls by the figures and nobody did
		const moved = mean > 0 && [shop, others, engine, own].some(isSeen);
		return {
			...(moved ? { usual: usually, mean, ...between(found, worth) } : unmoved(usually)),
			observations: own.calls + others.calls,
			...{ own, others, engine, shop }
		};
	};
	return (kindId, engineKey, family) =>
		keep(`${kindId} ${engineKey} ${family}`, () => work(kindId, engineKey, family));
}
