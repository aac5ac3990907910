import type { PartItem } from '../parts/view';

export interface Facet {
	value: string;
	count: number;
	/** As people say it, where the value is an id. */
	said?: string;
}

export const FACETS = ['kind', 'grade', 'state', 'bin', 'engine', 'price', 'proof'] as const;
export type FacetName = (typeof FACETS)[number];

export interface StillOnDonor {
	number: string;
	engine: string;
	minutes: number;
	kind: string;
	kindName: string;
	state: string;
}

export interface NearKind {
	kind: string;
	kindName: string;
	count: number;
}

/** A part that answers. */
export interface FoundItem extends PartItem {
	/** Why it stands here, where it is not plain from its kind. */
	reason: string | null;
	/** Held until, or out since. */
	heldUntil: string | null;
	out: { as: 'fitted' | 'sold'; to: string | null; on: string } | null;
	/** How many of the same thing answer; null for one alone. */
	group: { same: string; count: number } | null;
}

export interface Found {
	items: FoundItem[];
	/** Parts that answer, the same things counted each. */
	total: number;
	facets: Record<FacetName, Facet[]>;
	donors: StillOnDonor[];
	/** Parts that went out and would have answered, the last first. */
	gone: FoundItem[];
	nearest: NearKind[];
	/** Two kinds that one typed word may mean. */
	ask: { kinds: { kind: string; kindName: string }[] } | null;
	/** Filters that were said in words and hold for this answer. */
	said: { name: 'price' | 'proof' | 'grade'; value: string }[];
	/** Words that no part has: the answer is what was named without them. */
	without: string[];
	next: string | null;
}
