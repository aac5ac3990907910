import type { AgeClock } from '../bins/age';
import type { PhotoLinks } from '$lib/photos/links';
import type { Grade, PartState, ProofWay } from './words';
import type { Verdict } from './verdict-view';

/** One row of any list of parts. */
export interface PartItem {
	id: number;
	tag: string;
	kind: string;
	kindName: string;
	label: string;
	grade: Grade;
	state: PartState;
	/** The bin's address, or the donor box it lies in; null while it lies nowhere. */
	bin: string | null;
	/** D12, or null for old stock. */
	donor: string | null;
	engine: string;
	askedCents: number | null;
	copyCents: number | null;
	newCents: number | null;
	verdict: Verdict['verdict'] | null;
	gainCents: number | null;
	/** Address of a small picture. */
	photo: string | null;
	heldBy: string | null;
	/** What is missing from its set; '' where nothing is. */
	setMissing: string;
}

/** One figure of a test, such as 18 A free run. */
export interface ProofFigure {
	field: string;
	value: number;
	unit: string;
}

export interface ProofView {
	how: ProofWay;
	figure: number | null;
	unit: string;
	/** All that was read; the first one is `figure`. */
	figures: ProofFigure[];
	note: string;
	passed: boolean;
	by: string;
	at: Date;
}

/** One line of a thing's history: who did what, when; `undo` names the event while it can be undone. */
export interface Happening {
	id: number;
	at: Date;
	by: string;
	said: string;
	undo: boolean;
}

export interface PartDonor {
	id: number;
	number: string;
	state: string;
	cause: string | null;
	secondCause: string | null;
	sureness: string | null;
}

export interface PartView extends Omit<PartItem, 'photo'> {
	version: number;
	system: string;
	numbers: string[];
	set: string;
	checklist: string[];
	massGrams: number | null;
	note: string;
	binPlace: string;
	inRedBin: boolean;
	donorOf: PartDonor | null;
	heldUntil: Date | null;
	outAs: 'fitted' | 'sold' | null;
	outTo: string | null;
	outCents: number | null;
	scrapReason: string | null;
	destroyed: boolean;
	/** It failed or came back and nothing has proved it since. */
	doubtful: boolean;
	pulledAt: Date;
	/** Of a kind that ages: how old, and when to look again. */
	age: AgeClock | null;
	proofs: ProofView[];
	photos: { id: number; blur: string; links: PhotoLinks; alt: string }[];
	history: Happening[];
	worth: Verdict | null;
	/** The next unit that would answer the same call. */
	next: PartItem | null;
	/** Why somebody else has it, or where it went: by whom and since when. */
	taken: string | null;
}

/** A kind that a donor still carries. */
export interface KindStillOn {
	kind: string;
	kindName: string;
	system: string;
	chance: number;
	level: 'high' | 'medium' | 'low' | 'ruined';
	minutes: number;
	verdict: Verdict['verdict'] | null;
	gainCents: number | null;
	/** Who waits for it, without a name: a customer (W12). */
	waitingFor: string | null;
	/** Why it cannot become stock; null where it can. */
	never: string | null;
}

/** What came of putting parts into one place. */
export interface PutAwayDone {
	/** The place as it is said: K3-1, the box of D12. */
	to: string;
	put: { tag: string; eventId: number }[];
	/** Those that lay there already. */
	there: string[];
	refused: { tag: string; said: string }[];
}
