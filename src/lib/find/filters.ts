import { GRADES, PART_STATES, PROOFS, type PartState } from '../parts/words';
import type { FindQuery, ProofFilter } from './input';
import type { Plan } from './plan';

/** The order in which parts stand: what is there first. Numbers of the index. */
export const STANDS: readonly PartState[] = [
	'shelved',
	'pulled',
	'held',
	'back',
	'missing',
	'out',
	'scrapped'
];

export const gradeNo = (grade: string): number =>
	GRADES.indexOf(grade as (typeof GRADES)[number]) + 1;
export const standsNo = (state: string): number =>
	STANDS.indexOf(state as (typeof PART_STATES)[number]);

/** From where to where the proofs lie that a filter means: 0 unproved, 1 look-over to 5 bench test hot. */
export function proofRange(proof: ProofFilter): [number, number] {
	if (proof === 'unproved') return [0, 0];
	if (proof === 'tested') return [2, 5];
	const at = PROOFS.indexOf(proof) + 1;
	return [at, at];
}

/** Price bands as filters say them, cheapest first; the last is for parts that have none. */
export const PRICE_BANDS = ['-10', '10-25', '25-50', '50-100', '100-', 'none'] as const;

/** A price filter in cents: from, up to but not with. Null for parts without a price. */
export function priceRange(price: string): { low: number | null; high: number | null } | null {
	if (price === 'none') return null;
	const [low = '', high = ''] = price.split('-');
	return {
		low: low === '' ? null : Number(low) * 100,
		high: high === '' ? null : Number(high) * 100 - 1
	};
}

/** What was said in words, where no filter of the address says otherwise. */
export function saidFilters({ filters }: Plan, query: FindQuery) {
	const { lowCents, highCents, proof, grade } = filters;
	const priced = !query.price && (lowCents !== null || highCents !== null);
	return {
		price: priced ? { low: lowCents, high: highCents } : null,
		proof: query.proof ? null : proof,
		grade: query.grade ? null : grade
	};
}
