import type { FitRank } from '../parts/wanted';
import type { Grade, PartState } from '../parts/words';
import type { LetterState } from '../customers/words';
import type { TellBy, Waiter, WantState } from './words';

/** What answers a want: a part, or a donor that still carries one. */
export interface MatchView {
	id: number;
	rank: FitRank;
	at: Date;
	/** Nobody has looked at it yet. */
	isNew: boolean;
	part: {
		tag: string;
		kindName: string;
		engine: string;
		grade: Grade;
		state: PartState;
		bin: string | null;
		askedCents: number | null;
		heldBy: string | null;
	} | null;
	donor: { number: string; engine: string; state: string; minutes: number } | null;
}

/** One row of the list of wants. */
export interface WantItem {
	id: number;
	number: number;
	who: Waiter;
	/** The customer's name or the job. */
	name: string;
	customerId: number | null;
	/** recoil starter for Ondrake TARN-21L */
	what: string;
	state: WantState;
	mostCents: number | null;
	addedAt: Date;
	toldAt: Date | null;
	toldBy: TellBy | null;
	/** How many things here answer it, and how many of them nobody has looked at. */
	matches: number;
	fresh: number;
	/** How its newest letter fared, if there was one. */
	letter: LetterState | null;
}

export interface WantView extends WantItem {
	kind: string;
	engine: string;
	measures: string;
	numbers: string[];
	note: string;
	tellBy: TellBy;
	phone: string;
	email: string;
	lettersOff: boolean;
	/** The tag of the part that is kept for them. */
	kept: string | null;
	by: string;
	version: number;
	found: MatchView[];
	history: { id: number; at: Date; by: string; said: string; undo: boolean }[];
}

/** Who waits for a thing, as its page shows it; names only for those at the counter. */
export interface WantedBy {
	number: number;
	said: string;
	what: string;
	/** Where the want is read, for those who may. */
	isOpenTo: boolean;
}
