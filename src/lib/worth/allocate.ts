import { amount, check, type Figure } from './figures';
import { wholeCents } from './money';
import { WorthError } from './worth-error';

/** A kept part. Each way of spreading needs its own figures. */
export interface PartToCost {
	id: string;
	askedCents?: number | null;
	/** Its own cleaning and testing still to come. */
	ownCostCents?: number | null;
	/** What it sells for as it comes off. */
	splitOffCents?: number | null;
	grams?: number | null;
}

export interface Allocation {
	/** What was paid for the donor, its intake and teardown. */
	jointCents: number;
	/** Net proceeds of what is scrapped. */
	byProductCents: number;
	parts: readonly PartToCost[];
	method: 'nrv' | 'split-off' | 'physical';
}

export interface Shares {
	shares: { id: string; cents: number }[];
	/** What no part can bear: it stays on the donor. */
	lossCents: number;
	/** By-product beyond the joint cost. */
	incomeCents: number;
}

const whole = (unit: string): Figure => ({ unit, whole: true });
const optional = (unit: string): Figure => ({ unit, optional: true });

const FIGURES: Record<Allocation['method'], Record<string, Figure>> = {
	nrv: { askedCents: amount('asked price in cents'), ownCostCents: optional('own cost in cents') },
	'split-off': { splitOffCents: amount('price as it comes off, in cents') },
	physical: { grams: amount('mass in grams') }
};

function weightOf(part: PartToCost, at: number, method: Allocation['method']): number {
	if (typeof part !== 'object' || part === null || typeof part.id !== 'string') {
		throw new WorthError(`parts[${at}].id`, `parts[${at}].id: the id of the part, text`);
	}
	for (const [field, figure] of Object.entries(FIGURES[method])) {
		const name = `parts[${at}].${field}`;
		check({ [name]: part[field as keyof PartToCost] }, { [name]: figure });
	}
	if (method === 'nrv') return Math.max(0, (part.askedCents ?? 0) - (part.ownCostCents ?? 0));
	return (method === 'physical' ? part.grams : part.splitOffCents) ?? 0;
}

/** Whole cents by weight that add up exactly: the largest remainders take the cents left over. */
function spread(cents: number, weights: readonly number[], total: number): number[] {
	const exact = weights.map((weight) => cents * (weight / total));
	const shares = exact.map(Math.floor);
	const left = cents - shares.reduce((sum, share) => sum + share, 0);
	const byRemainder = exact
		.map((share, at) => ({ at, remainder: share - Math.floor(share) }))
		.filter(({ at }) => weights[at]! > 0)
		.sort((a, b) => b.remainder - a.remainder);
	for (const { at } of byRemainder.slice(0, left)) shares[at]! += 1;
	return shares;
}

/**
 * Spreads the joint cost of a donor over its kept parts. Scrap is a by-product: its net proceeds
 * lower the cost first, what is beyond the cost is income. The rest goes by estimated net realisable
 * value (asked price less what is still to be done on the part), by sales value at split-off or by
 * mass. What has no value gets no share, never a negative one; with no value at all the cost stays
 * on the donor as a loss.
 * In: joint cost and by-product in whole cents; per part the figures of the way chosen. Out: whole
 * cents; shares and loss add up to the joint cost less the by-product exactly (0 where that is less).
 * Throws WorthError naming the field. Source: Horngren, Datar and Rajan, "Cost Accounting", joint costs.
 */
export function allocate(input: Allocation): Shares {
	check(input, {
		jointCents: whole('joint cost in cents'),
		byProductCents: whole('scrap in cents')
	});
	const { parts, method } = input;
	if (!Object.hasOwn(FIGURES, method)) {
		throw new WorthError('method', "method: one of 'nrv', 'split-off' and 'physical'");
	}
	if (!Array.isArray(parts)) throw new WorthError('parts', 'parts: a list of the kept parts');
	const weights = (parts as readonly PartToCost[]).map((part, at) => weightOf(part, at, method));
	const total = weights.reduce((sum, weight) => sum + weight, 0);
	const left = Math.max(0, input.jointCents - input.byProductCents);
	const cents = total > 0 ? spread(left, weights, total) : weights.map(() => 0);
	return {
		shares: parts.map(({ id }: PartToCost, at) => ({ id, cents: cents[at]! })),
		lossCents: total > 0 ? 0 : left,
		incomeCents: Math.max(0, input.byProductCents - input.jointCents)
	};
}

const MOST = 1e12;

/**
 * What a part stands in the books at: the lower of its cost and what it nets, part by part, never
 * pooled; asked again after the value recovered it rises to its cost at most. In: cents; the net may
 * be below nil (then it is carried at nil). Out: whole cents carried and written down.
 * Throws WorthError naming the field. Source: IAS 2 Inventories, paragraphs 9 and 28 to 33.
 */
export function carry(input: { costCents: number; netRealisableCents: number }) {
	check(input, {
		costCents: amount('cost in cents'),
		netRealisableCents: { unit: 'net realisable value in cents', least: -MOST, most: MOST }
	});
	const carried = Math.min(input.costCents, Math.max(0, input.netRealisableCents));
	const carriedCents = wholeCents(carried);
	return { carriedCents, writeDownCents: wholeCents(input.costCents) - carriedCents };
}
