const LEAST_GRAMS = 500;

/** What most engines come to once they are stripped: steel is still in the aluminium. */
export const USUAL_CLASS = 'Al-Fe';

/**
 * What is left of an engine, roughly: what one of its class weighs less what was taken off.
 * In: grams of a whole one, grams of each part that is off. Out: grams, never under half a kilogram.
 */
export function carcassGrams(wholeGrams: number, offGrams: readonly number[]): number {
	const left = offGrams.reduce((grams, off) => grams - off, wholeGrams);
	return Math.max(LEAST_GRAMS, Math.round(left / 100) * 100);
}
