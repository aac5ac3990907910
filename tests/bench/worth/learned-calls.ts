import { learnRate } from '$lib/worth';
import type { Family, Item } from './market';

// what each belief weighs against what came, in calls
const WORTH = { shop: 10, kind: 8, family: 10, item: 12 };
// a figure is worked out anew this often, in years
const FRESH = 0.5;

interface Fresh {
	until: number;
	mean: number;
}

/**
 * Calls learned in four steps: the shop over all it is asked for, the kind over all families, the
 * family over all its kinds, and last the one kind of the one family, whose few calls must not
 * swing it.
 */
export class LearnedCalls {
	private readonly counts = new Map<object, number>();
	private readonly fresh = new Map<object, Fresh>();
	private readonly familyOf = new Map<Item, Family>();
	/** How many ordinary families the calls for a kind come from. */
	private readonly marks = new Map<object, number>();

	private expected = 0;

	constructor(families: readonly Family[]) {
		for (const family of families)
			for (const item of family.items) {
				this.familyOf.set(item, family);
				this.expected += item.usualCalls;
				this.marks.set(item.kind, (this.marks.get(item.kind) ?? 0) + item.mark);
			}
	}

	called(item: Item): void {
		for (const of of [this, item, item.kind, this.familyOf.get(item)])
			if (of) this.counts.set(of, (this.counts.get(of) ?? 0) + 1);
	}

	private learn(of: object, at: number, years: number, worth: number, believed: () => number) {
		const found = this.fresh.get(of);
		if (found && found.until > at) return found.mean;
		const mean = believed();
		const observations = { calls: this.counts.get(of) ?? 0, years };
		const learned = learnRate({ prior: { shape: worth, years: worth / mean }, observations }).mean;
		this.fresh.set(of, { until: (Math.floor(at / FRESH) + 1) * FRESH, mean: learned });
		return learned;
	}

	/** Times what the defaults and the marks make one expect, over everything. */
	private ofShop(at: number): number {
		return this.learn(this, at, at * this.expected, WORTH.shop, () => 1);
	}

	private ofKind({ kind }: Item, at: number): number {
		const years = at * (this.marks.get(kind) ?? 1);
		return this.learn(kind, at, years, WORTH.kind, () => kind.callsPerYear * this.ofShop(at));
	}

	private ofFamily(item: Item, at: number): number {
		const family = this.familyOf.get(item);
		if (!family) return item.mark;
		const calls = family.items.reduce((sum, each) => sum + this.known(each, at), 0);
		return this.learn(family, at, at * calls, WORTH.family, () => item.mark);
	}

	private known = (item: Item, at: number) =>
		item.kind.callsPerYear === 0 ? 0 : this.ofKind(item, at);

	perYear(item: Item, at: number): number {
		if (item.kind.callsPerYear === 0) return 0;
		const believed = () => this.ofKind(item, at) * this.ofFamily(item, at);
		return this.learn(item, at, at, WORTH.item, believed);
	}
}
