/** A price as pages and the outside edge show it. */
export interface PriceView {
	id: number;
	kind: string;
	kindName: string;
	engine: string;
	number: string;
	newCents: number;
	copyCents: number | null;
	source: string;
	seenOn: string;
	stale: boolean;
	version: number;
}

/** A price that was taken off the list and can be put back. */
export interface RemovedPrice {
	event: number;
	at: Date;
	by: string;
	kindName: string;
	engine: string;
	number: string;
	newCents: number;
}

/** The columns a price list can be sorted by, each with the id as its last key. */
export const PRICE_SORTS = ['kind', 'engine', 'number', 'new', 'copy', 'seen'] as const;
export type PriceSort = (typeof PRICE_SORTS)[number];

export const isPriceSort = (word: string | null): word is PriceSort =>
	(PRICE_SORTS as readonly (string | null)[]).includes(word);

/** What a price is for, in words. */
export const priceFor = (price: { engine: string; number: string }): string =>
	[price.number && `number ${price.number}`, price.engine].filter(Boolean).join(', ');
