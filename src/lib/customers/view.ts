import type { CustomerKind, LetterState } from './words';

/** One row of the list of customers. */
export interface CustomerItem {
	id: number;
	/** 'a customer' once it is erased. */
	name: string;
	kind: CustomerKind;
	phone: string;
	email: string;
	/** How many wants of theirs are open. */
	waits: number;
}

export interface CustomerView extends CustomerItem {
	note: string;
	/** Since when they want no letters about what they wait for. */
	lettersOffAt: Date | null;
	erasedAt: Date | null;
	addedAt: Date;
	version: number;
	letters: LetterView[];
}

export interface LetterView {
	id: number;
	about: string;
	aboutId: number;
	to: string;
	subject: string;
	text: string;
	state: LetterState;
	tries: number;
	fault: string;
	by: string;
	writtenAt: Date;
	sentAt: Date | null;
}
