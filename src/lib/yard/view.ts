import type { Waste, WasteWay } from './words';

/** A donor's first account, when it is stripped. Money only for those who see costs. */
export interface DonorAccount {
	paidCents: number;
	/** Sold and paid. */
	broughtCents: number;
	sold: number;
	fitted: number;
	/** Ready on the shelf, held or pulled: how many, asked and carried at. */
	onShelf: number;
	askedCents: number;
	carriedCents: number;
	scrapCents: number;
	/** What no part can bear. */
	lossCents: number;
}

export interface LeftOn {
	kind: string;
	kindName: string;
	/** What it would still bring for its minutes. */
	gainCents: number;
	minutes: number;
}

export interface FinishView {
	left: LeftOn[];
	grams: number;
	scrapClass: string;
	drained: string[];
	account: DonorAccount | null;
}

export interface RunItem {
	number: number;
	on: string;
	buyer: string;
	ticket: string;
	grams: number;
	cents: number;
	donors: string[];
	by: string;
	takenBack: { at: string; because: string } | null;
}

export interface RunView extends RunItem {
	note: string;
	photo: number | null;
	loads: { scrapClass: string; said: string; grams: number; cents: number }[];
}

/** A stripped donor that a run may take. */
export interface ReadyDonor {
	number: string;
	engine: string;
	grams: number;
	scrapClass: string;
	/** Why it may not go yet. */
	shut: string | null;
}

export interface WasteItem {
	id: number;
	what: Waste;
	way: WasteWay;
	millilitres: number;
	on: string;
	who: string;
	ticket: string;
	note: string;
	by: string;
	corrects: number | null;
	corrected: boolean;
}

export interface WasteLog {
	items: WasteItem[];
	/** What should be in the cans now. */
	standing: { what: Waste; millilitres: number }[];
}

export interface RegisterEntry {
	number: number;
	at: string;
	on: string;
	donor: string;
	engine: string;
	serial: string;
	route: string;
	document: string;
	fromName: string;
	fromAddress: string;
	idSeen: string;
	holdUntil: string | null;
	because: string;
	paidCents: number | null;
	photo: number | null;
	by: string;
	/** A newer entry stands in its place. */
	replaced: boolean;
}
