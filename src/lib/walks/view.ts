import type { AgeClock } from '../bins/age';
import type { PartItem } from '../parts/view';
import type { ClassKilos } from './kilos';
import type { RedNext } from './red';
import type { Outcome, WalkWhat } from './words';

export interface WalkItem {
	id: number;
	what: WalkWhat;
	by: string;
	startedAt: Date;
	endedAt: Date | null;
	/** How many stops there are, and how many are answered. */
	total: number;
	done: number;
}

export interface WalkStop {
	n: number;
	/** Null: nothing should lie here. */
	part: PartItem | null;
	kindName: string;
	tag: string | null;
	why: string;
	outcome: Outcome | null;
	note: string;
	by: string | null;
	at: Date | null;
	age: AgeClock | null;
}

/** Where a walk stops: a bin, or 0 and no address for what lies in none. */
export interface WalkPlace {
	id: number;
	address: string | null;
	place: string;
	red: boolean;
	total: number;
	open: number;
}

export interface WalkView extends WalkItem {
	places: WalkPlace[];
	/** The stops of the place that is shown, or of all when the walk is over. */
	at: WalkPlace | null;
	stops: WalkStop[];
	/** A purge: what was scrapped, or would be, as kilos. */
	kilos: ClassKilos[];
	tally: { outcome: Outcome; count: number }[];
}

/** What each walk would be about now. */
export interface WalkChoices {
	putAway: number;
	fetch: number;
	heldFor: string[];
	bins: number;
	/** When the bin that was not counted for longest was counted; null: never. */
	oldestCount: Date | null;
	lastPurge: Date | null;
}

/** A part that turned up where it does not belong. */
export interface Stray {
	tag: string;
	kindName: string;
	label: string;
	engine: string;
	/** Where it belongs, if anywhere. */
	home: string | null;
	/** It may not stay here: why. */
	notHere: string | null;
}

export interface RedPart {
	item: PartItem;
	since: Date;
	by: string;
	/** Why it lies there. */
	because: string;
	next: RedNext;
	why: string;
	howTested: string;
	testMinutes: number;
	age: AgeClock | null;
}
