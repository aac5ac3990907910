import type { FamilyMark } from '$lib/people/policy';
import type { CauseId } from '$lib/trade';
import type { GainInput, Terms, VerdictWord } from '$lib/worth';
import type { Sureness } from '$lib/donors/words';
import type { Grade, ProofWay } from './words';

/** What a verdict needs to know of a part; figures of the shop come from its policy. */
export interface VerdictSubject {
	kind: string;
	/** As its tag says it. */
	grade: Grade;
	cause: CauseId | null;
	secondCause: CauseId | null;
	sureness: Sureness | null;
	/** Oldest first. */
	proofs: readonly { how: ProofWay; passed: boolean }[];
	/** Place in the queue, 1 for the first. */
	place: number;
	/** How many that answer the same call can be handed out: this one too unless it is held, back or missing. */
	have: number;
	price: VerdictPrice | null;
	massGrams: number | null;
	/** Room that it takes, where known. */
	litres: number | null;
	bin: { yearlyCostCents: number | null; litres: number | null } | null;
	/** Still on its donor: pulling it is yet to be paid for. */
	stillOn: boolean;
	family: FamilyMark;
	/** The engine it fits, as keys are made; left out where it is not known. */
	engineKey?: string;
	/** A customer waits whom no unit on the shelf answers. */
	waiting: boolean;
	/** Who waits, without a name: a customer (W12). */
	waitingFor?: string | null;
}

export interface VerdictPrice {
	newCents: number;
	copyCents: number | null;
	source: string;
	seenOn: string;
	stale: boolean;
}

export type TermUnit =
	| 'cents'
	| 'cents an hour'
	| 'cents a year'
	| 'cents a kilogram'
	| 'share'
	| 'share a year'
	| 'a year'
	| 'minutes'
	| 'grams'
	| 'count';

/** One line of the sum behind a verdict. */
export interface VerdictTerm {
	said: string;
	value: number;
	unit: TermUnit;
	source: string;
	sum?: boolean;
}

export interface Verdict {
	verdict: VerdictWord | 'needs a price' | 'never';
	/** Why, where money is not the reason. */
	reason: string | null;
	gainCents: number | null;
	/** When to clean and test; null where nothing is left to do. */
	timing: 'when-called' | 'now' | null;
	/** Null with a gain: without limit. */
	keepUpTo: number | null;
	have: number;
	place: number;
	/** Asked for the grade it has, or will have if it passes its test. */
	askedCents: number | null;
	askedGrade: Grade;
	/** What it fetches sold untested, where it waits for its test. */
	untestedCents: number | null;
	newCents: number | null;
	copyCents: number | null;
	breakEvenUsedCents: number | null;
	breakEvenNewCents: number | null;
	/** No new price makes it pay while the copy costs what it does. */
	copyBinds: boolean;
	stale: boolean;
	/** Without a price: the verdict where both ends of what its kind costs agree. */
	rough: VerdictWord | null;
	scrapCents: number;
	waitYears: number | null;
	everCalled: number | null;
	belowLeast: boolean;
	/** Who waits for it, without a name; null where nobody does. */
	waitingFor: string | null;
	/** Empty for those who may not see them. */
	terms: VerdictTerm[];
	figures: { input: GainInput; terms: Terms } | null;
}
