import { placeOf, type Queued } from '$lib/parts/place';
import type { VerdictPrice, VerdictSubject } from '$lib/parts/verdict-view';
import type { Policy } from '$lib/people/policy';
import { isStale } from '$lib/prices/stale';
import { isCauseId } from '$lib/trade';
import type { Context } from '../context';
import type { PriceRow } from '../prices';
import type { VerdictRow } from './verdict-rows';

const causeOf = (id: string | null | undefined) => (id && isCauseId(id) ? id : null);

/** The price that counts, marked when it is old. */
export const priceOf = (
	row: PriceRow | undefined,
	ctx: Context,
	policy: Policy
): VerdictPrice | null =>
	row
		? {
				newCents: row.newCents,
				copyCents: row.copyCents,
				source: row.source,
				seenOn: row.seenOn,
				stale: isStale(row.seenOn, ctx.now, policy.staleDays)
			}
		: null;

type Cause = Pick<VerdictRow, 'cause' | 'secondCause' | 'sureness'>;

/** A part as if still on its donor and unproved; what is known beyond that is laid over it. */
export function subjectOf(
	asked: Queued & Cause,
	others: readonly Queued[],
	price: VerdictPrice | null,
	policy: Policy
): VerdictSubject {
	return {
		kind: asked.kind,
		grade: asked.grade,
		cause: causeOf(asked.cause),
		secondCause: causeOf(asked.secondCause),
		sureness: asked.sureness,
		proofs: [],
		...placeOf(asked, others),
		price,
		massGrams: null,
		litres: null,
		bin: null,
		stillOn: true,
		family: policy.families[asked.engineKey] ?? 'some',
		engineKey: asked.engineKey,
		waiting: false
	};
}
