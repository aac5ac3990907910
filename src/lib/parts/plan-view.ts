import type { PullPlan, PullStep } from '$lib/worth';

/** A part to take off, by the id of its kind. */
export interface PlanStep extends PullStep {
	kindName: string;
	/** Kept, but without a price: counted at the middle of what its kind costs. */
	rough: boolean;
	/** What it opens the way to, where it is not kept itself. */
	opens: string[];
	/** The whole that it stays with, where that is kept. */
	goesWith: string | null;
	/** What it is given up for, though it would be worth keeping. */
	givenUpFor: string[];
	/** Who waits for it: a customer (W12); null where nobody does. */
	waitingFor: string | null;
}

/** A part that stays on, with what adding it would take and bring. */
export interface PlanBelow {
	id: string;
	kindName: string;
	minutes: number;
	totalCents: number;
	rough: boolean;
	/** The whole that it stays with. */
	goesWith: string | null;
	/** What spoils it on its way off. */
	sacrificedFor: string[];
	/** What is kept and would be spoiled by it. */
	spoils: string[];
	waitingFor: string | null;
}

/** The pull plan of a donor as a page shows it. */
export interface PlanView extends Omit<PullPlan, 'order' | 'below'> {
	/** Null: no limit. */
	minutesAtHand: number | null;
	order: PlanStep[];
	below: PlanBelow[];
	/** How many of its kinds have no price. */
	unpriced: number;
}
