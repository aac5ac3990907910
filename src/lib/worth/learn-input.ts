import { amount, check, share, type Figure } from './figures';
import { WorthError } from './worth-error';

/** What was believed before: a mean, and how many observations (for a rate: years) it is worth. */
export interface MeanPrior {
	mean: number;
	worth: number;
}

/** What was learned. `low` and `high` hold the true figure with chance `level`. */
export interface Learned {
	mean: number;
	low: number;
	high: number;
	observations: number;
}

const USUAL_LEVEL = 0.95;
const levelFigure: Figure = { unit: 'chance that the interval holds', least: 0.01, most: 0.9999 };

/** An object inside the input, or a WorthError that names it and what it holds. */
export function within<Part extends object>(part: Part, field: string, holds: string): Part {
	if (typeof part === 'object' && part !== null) return part;
	throw new WorthError(field, `${field}: an object with ${holds}`);
}

/** The tails on either side of the interval, from the level asked for. */
export function tails(input: { level?: number | null }): { low: number; high: number } {
	check(input, { level: { ...levelFigure, optional: true } });
	const outside = (1 - (input.level ?? USUAL_LEVEL)) / 2;
	return { low: outside, high: 1 - outside };
}

/** Checks a prior said as a mean and its worth. `most` is the most that the mean can be. */
export function meanPrior(
	prior: MeanPrior,
	unit: string,
	worthIn: string,
	most?: number
): MeanPrior {
	const mean = most === 1 ? share(unit) : amount(unit);
	check(prior, { mean, worth: amount(worthIn) });
	return prior;
}
