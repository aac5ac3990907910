import type { FamilyMark, Policy } from '$lib/people/policy';
import type { CauseId, Level } from '$lib/trade';
import type { Learned } from '$lib/worth';
import type { Sureness } from '$lib/donors/words';
import type { CallsSteps } from './calls-rule';
import type { Grade } from './words';

/** What the history of a shop says, counted and not yet judged. */
export interface Observed {
	/** Parts by how their latest bench test before any come-back ended. */
	tests: readonly TestsSeen[];
	/** How often parts of a kind went out, and how often one came back. */
	outs: readonly { kind: string; out: number; back: number }[];
	/** Parts taken, and the years in which one stood ready; engine '' is one that is not known. */
	calls: readonly CallsSeen[];
	/** What was asked for in vain, and the years in which none stood ready. */
	asked: readonly AskedSeen[];
	/** What was paid for parts whose new price is known. */
	sales: readonly SaleSeen[];
}

export interface TestsSeen {
	kind: string;
	cause: CauseId | null;
	secondCause: CauseId | null;
	sureness: Sureness | null;
	passed: number;
	failed: number;
}
export interface CallsSeen {
	kind: string;
	engineKey: string;
	calls: number;
	years: number;
}
/** Searches that ended in nothing, and wants that nothing was sold to. */
export interface AskedSeen {
	kind: string;
	engineKey: string;
	sought: number;
	wanted: number;
	years: number;
}
export interface SaleSeen {
	grade: Grade;
	newCents: number;
	copyCents: number | null;
	paidCents: number;
}

/** A figure as the history moved it; `low` to `high` holds the true one 95 times of 100. */
export interface Figure extends Learned {
	/** By the policy or the kind, before the history. */
	usual: number;
}
/** Calls: on this engine, for its kind on others, for other kinds on it, and for all other kinds. */
export interface CallsFigure extends Figure {
	own: CallsSteps['own'];
	others: CallsSteps['others'];
	engine: CallsSteps['engine'];
	shop: CallsSteps['shop'];
}

/** What a shop's history makes of each figure; one never observed is the usual one to the letter. */
export interface Taught {
	/** `less`: the tests of the part itself, which count for it already as its own proofs. */
	chance(kindId: string, level: Level, less?: TestsSeen): Figure;
	comeBack(kindId: string): Figure;
	calls(kindId: string, engineKey: string, family: FamilyMark): CallsFigure;
	share(grade: Grade): Figure;
}

/** The policy of a shop with what its history has taught it; without a history, the policy alone. */
export type ShopFigures = Policy & { taught?: Taught };
