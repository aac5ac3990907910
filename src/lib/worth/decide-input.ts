import { amount, share, type Figure } from './figures';

/** What is known of a donor. Amounts in cents, chances and reaches 0 to 1. */
export interface DecisionInput {
	/** Chance that the repair holds. */
	fixChance: number;
	/** Price of the running engine. */
	fixedPriceCents: number;
	/** Discounted chance that the running engine is called for. */
	fixReach: number;
	newPartsCents: number;
	labourCents: number;
	/** What its parts bring when each is pulled only when called for, before its scrap. */
	parkCents: number;
	/** Yard cost to the review. */
	yardCents: number;
	/** Total of the pull plan. */
	stripTotalCents: number;
	/** Price as a dead engine. */
	wholePriceCents: number;
	wholeReach: number;
	handlingCents: number;
	scrapAllCents: number;
	disposalCents: number;
}

export const decisionFigures: Record<keyof DecisionInput, Figure> = {
	fixChance: share('chance that the repair holds'),
	fixedPriceCents: amount('price of the running engine in cents'),
	fixReach: share('discounted chance that the running engine is called for'),
	newPartsCents: amount('new parts in cents'),
	labourCents: amount('labour of the repair in cents'),
	parkCents: amount('what its parts bring when pulled on call, in cents'),
	yardCents: amount('yard cost in cents'),
	stripTotalCents: amount('total of the pull plan in cents'),
	wholePriceCents: amount('price as a dead engine in cents'),
	wholeReach: share('discounted chance that the dead engine is called for'),
	handlingCents: amount('handling in cents'),
	scrapAllCents: amount('scrap of everything in cents'),
	disposalCents: amount('disposal in cents')
};
