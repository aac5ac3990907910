import { PRICE_BANDS, STANDS } from '$lib/find/filters';
import type { Facet, Found } from '$lib/find/view';
import { GRADES, PROOFS } from '$lib/parts/words';
import { findKind } from '$lib/trade';
import type { Counts } from './answer';

type Row = NonNullable<Counts['kind']>[number];

const said = (rows: Row[] | null, name: (value: number) => string | undefined): Facet[] =>
	(rows ?? []).map(({ value, count }) => ({ value: name(Number(value)) ?? `${value}`, count }));

const proved = ['unproved', ...PROOFS];
const byProof = (at: number) => proved[at];
/** A band that no price falls into is that of parts without one. */
const byBand = (rows: Row[] | null): Facet[] =>
	(rows ?? []).map(({ value, count }) => ({
		value: value === null ? 'none' : (PRICE_BANDS[Number(value)] ?? 'none'),
		count
	}));

/** The counts of each filter in words. */
export function facetsOf(counts: Counts): Found['facets'] {
	return {
		kind: (counts.kind ?? []).map(({ value, count }) => ({
			value: `${value}`,
			count,
			said: findKind(`${value}`)?.name ?? `${value}`
		})),
		grade: said(counts.grade, (no) => GRADES[no - 1]),
		state: said(counts.state, (no) => STANDS[no]),
		bin: (counts.bin ?? []).map(({ value, count }) => ({ value: `${value}`, count })),
		engine: (counts.engine ?? []).map(({ value, count, said }) => ({
			value: `${value}`,
			count,
			...(said ? { said } : {})
		})),
		price: byBand(counts.price),
		proof: said(counts.proof, byProof)
	};
}
