import { FAMILY_FACTOR, type FamilyMark, type Policy } from '$lib/people/policy';
import { learnRate } from '$lib/worth';
import { figuresOf } from './kind-figures';
import { once, unmoved } from './learn-once';
import type { CallsFigure, CallsSeen, Figure, Observed, Taught } from './learned-view';

const NONE = { calls: 0, years: 0 };
type Seen = Pick<CallsSeen, 'calls' | 'years'>;

function rate(mean: number, worth: number, observations: Seen): Figure {
	// nothing was watched; or nobody calls by the figures and nobody did
	const nothing = observations.calls === 0 && (observations.years === 0 || mean === 0);
	if (nothing) return unmoved(mean);
	return { usual: mean, ...learnRate({ prior: { mean, worth }, observations }) };
}

const scaled = ({ low, high }: Figure, times: number) => ({ low: low * times, high: high * times });

/** Calls for a kind on one engine; `times` as ordinary as the owner says that engine is. */
function onEngine(
	usual: number,
	times: number,
	worth: number,
	own: Seen,
	others: Seen
): CallsFigure {
	const ofKind = rate(usual, worth, others);
	const here = rate(ofKind.mean * times, worth, own);
	const isOwn = here.observations > 0 || own.years > 0;
	return {
		...{ usual: usual * times, mean: here.mean },
		...(isOwn ? { low: here.low, high: here.high } : scaled(ofKind, times)),
		observations: own.calls + others.calls,
		...{ own, others }
	};
}

/**
 * Calls in two steps, so that each is counted once: the kind by all its other engines, with lots
 * and hardly weighed, then the engine by its own.
 */
export function calls({ calls: seen }: Observed, policy: Policy): Taught['calls'] {
	const byKind = new Map<string, CallsSeen[]>();
	for (const row of seen) {
		const rows = byKind.get(row.kind) ?? [];
		if (rows.length === 0) byKind.set(row.kind, rows);
		rows.push(row);
	}
	const factor = (engineKey: string) => FAMILY_FACTOR[policy.families[engineKey] ?? 'some'];
	const keep = once<CallsFigure>();
	const work = (kindId: string, engineKey: string, family: FamilyMark): CallsFigure => {
		const rows = byKind.get(kindId) ?? [];
		const ours = rows.find((row) => engineKey !== '' && row.engineKey === engineKey);
		const others = rows
			.filter((row) => row !== ours)
			.reduce(
				(sum, row) => ({
					calls: sum.calls + row.calls,
					years: sum.years + row.years * factor(row.engineKey)
				}),
				NONE
			);
		const { callsPerYear } = figuresOf(kindId, policy);
		const own = ours ? { calls: ours.calls, years: ours.years } : NONE;
		return onEngine(callsPerYear, FAMILY_FACTOR[family], policy.priors.rateYears, own, others);
	};
	return (kindId, engineKey, family) =>
		keep(`${kindId} ${engineKey} ${family}`, () => work(kindId, engineKey, family));
}
