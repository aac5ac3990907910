import type { Level } from '$lib/trade';
import type { Item } from './market';
import type { Shelf, Unit } from './shelf';
import type { BenchPart, Donor } from './world';

/** The moment at which a rule is asked: it may look at the shelf, not at a part's fate. */
export interface Moment {
	at: number;
	/** Labour now, cents a minute. */
	rate: number;
	shelf: Shelf;
	/** Whether a customer still waits for one. */
	waiting: (item: Item) => boolean;
}

/** What a shop goes by. A fresh one for every run: it may learn. */
export interface Rule {
	/** Which parts of a donor to keep. */
	keep(donor: Donor, alive: readonly BenchPart[], moment: Moment): readonly BenchPart[];
	/** Whether a part that is kept is cleaned and tested at once. */
	cleanNow(part: BenchPart, moment: Moment): boolean;
	/** No place of their size is free: which of these goes. */
	drop(units: readonly Unit[], moment: Moment): Unit;
	/** Twice a year: what on the shelf is let go after all. */
	purge(moment: Moment): readonly Unit[];
	called(item: Item): void;
	tested(item: Item, level: Level, passed: boolean): void;
	/** A sale, with what was paid, and whether it came back. */
	sold(item: Item, level: Level, paidCents: number, cameBack: boolean): void;
}

export interface NamedRule {
	name: string;
	make: () => Rule;
}
