import type { Flagged } from './room';
import type { BinSize } from './size';
import type { BinUse } from './use';

export interface BinItem {
	id: number;
	tag: string;
	address: string;
	rack: string | null;
	shelf: number | null;
	slot: number | null;
	size: BinSize;
	litres: number | null;
	/** Null when unknown, or not for this member to see. */
	yearlyCostCents: number | null;
	/** What it may carry, all together. */
	loadKg: number | null;
	uses: BinUse[];
	/** The ids of the kinds that are named for it. */
	kinds: string[];
	purpose: string;
	place: string;
	red: boolean;
	version: number;
	parts: number;
	room: BinRoom;
}

/** How much room there is and what is to be put right; estimates, from the kinds that lie there. */
export interface BinRoom {
	/** Litres that it holds, as written on it or as its size usually has. */
	holds: number;
	litres: number;
	grams: number;
	/** 0 empty, 1 full. */
	fullness: number;
	flags: Flagged[];
}

export interface BinPart {
	tag: string;
	kind: string;
	kindName: string;
	label: string;
	grade: string;
	state: string;
	engine: string;
	pulledAt: Date;
	/** When it last passed a test. */
	testedAt: Date | null;
}

/** One line of the history of a bin. */
export interface BinHappening {
	id: number;
	at: Date;
	by: string;
	said: string;
	/** Whether it can still be taken back. */
	undo: boolean;
}

export interface BinView extends BinItem {
	contents: BinPart[];
	lastCounted: Date | null;
	history: BinHappening[];
}
