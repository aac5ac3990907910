import type { Grade, PartState, ProofWay } from '$lib/parts/words';
import type { Verdict } from '$lib/parts/verdict-view';
import type { Level, TestField } from '$lib/trade';

/** What was found when it was tried in place, before the engine was opened. */
export interface BenchProof {
	how: ProofWay;
	passed: boolean;
	figure: number | null;
	unit: string;
}

/** A kind that is still on, with all that is said about it at the bench. */
export interface BenchKind {
	kind: string;
	kindName: string;
	system: string;
	/** Of the machine around the engine. */
	machine: boolean;
	/** On the plan: kept, or only taken off because it is in the way; null: below the stop line. */
	plan: 'keep' | 'way' | null;
	/** What it is taken off for, or what is given up for it, in words. */
	planSaid: string | null;
	/** The whole that it comes off for and stays with; it is not logged by itself. */
	goesWith: string | null;
	/** The pieces that go with it. */
	pieces: string[];
	/** By itself, and with all that still stands before it. */
	minutes: number;
	minutesAll: number;
	/** What must come off first. */
	behind: string[];
	/** What taking it off spoils. */
	ruins: string[];
	gainCents: number | null;
	verdict: Verdict['verdict'];
	chance: number;
	level: Level;
	/** What its donor's death did to it, where people often get it wrong. */
	why: string[];
	/** Who waits for one, without a name. */
	waitingFor: string | null;
	have: number;
	/** Null: without limit, or nothing is gained by any. */
	keepUpTo: number | null;
	howTested: string;
	fields: TestField[];
	hot: boolean;
	checklist: string[];
	set: string[];
	never: string | null;
	/** Tried in place. */
	proof: BenchProof | null;
	/** For each way of checking, the grade that goes with it; '' stands for unchecked. */
	grades: Record<ProofWay | '', Grade>;
}

/** A part that came off, newest first. */
export interface BenchDone {
	tag: string;
	kind: string;
	kindName: string;
	grade: Grade;
	state: PartState;
	place: string | null;
	destroyed: boolean;
	by: string;
	/** By the member who looks. */
	mine: boolean;
	at: Date | string;
	/** The event that can be undone while nothing came after it. */
	undo: number | null;
}

export interface BenchView {
	/** When it stood so. */
	asOf: string;
	number: string;
	engine: string;
	causeSaid: string;
	offMachine: string;
	state: string;
	/** True, or why no part may be pulled. */
	open: true | string;
	/** Minutes at hand; null: no limit. */
	minutesAtHand: number | null;
	/** The plan as it stands now. */
	planMinutes: number;
	planCents: number;
	/** In the order of work; what is below the stop line comes after, most worthwhile first. */
	kinds: BenchKind[];
	leftOn: { kind: string; kindName: string; by: string }[];
	done: BenchDone[];
	logged: number;
}
