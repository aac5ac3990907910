export interface RackPlace {
	rack: string;
	shelf: number;
	slot: number;
}

/** An address as it is kept: upper case, single spaces. */
export const tidyAddress = (typed: string): string =>
	typed.trim().replace(/\s+/g, ' ').toUpperCase();

/**
 * Where an address points, if it is written as rack, shelf and slot.
 * In: what was typed, K3-1 or k 3 1. Out: rack K, shelf 3, slot 1, shelf 1 being the floor; null for
 * any other address, which is as good a bin but cannot be drawn.
 */
export function rackPlace(typed: string): RackPlace | null {
	const found = /^([A-Z]{1,12})[ -]?([1-9]\d?)[ -]([1-9]\d{0,2})$/.exec(tidyAddress(typed));
	return found ? { rack: found[1] ?? '', shelf: Number(found[2]), slot: Number(found[3]) } : null;
}

/** The address of a place in a rack, always written the same way. */
export const sayPlace = ({ rack, shelf, slot }: RackPlace): string => `${rack}${shelf}-${slot}`;

/** What is kept for a typed address: rack addresses in one spelling, others tidied. */
export function readAddress(typed: string): { address: string } & Partial<RackPlace> {
	const place = rackPlace(typed);
	return place ? { address: sayPlace(place), ...place } : { address: tidyAddress(typed) };
}
