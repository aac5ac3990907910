import { mmToInch, type LengthUnit } from './length';

// a fraction is said only where it is the size within what a calliper reads
const NEAR_MM = 0.02;

function asFraction(inches: number, bottom: number): string {
	const parts = Math.round(inches * bottom);
	const whole = Math.floor(parts / bottom);
	const top = parts % bottom;
	if (top === 0) return `${whole}`;
	return whole === 0 ? `${top}/${bottom}` : `${whole}-${top}/${bottom}`;
}

/**
 * Millimetres as inches in words of the trade: the coarsest fraction down to 1/64 that lies within
 * 0.02 mm, such as `1-1/8 in`, else decimals, such as `0.874 in`. In: millimetres, 0 or more.
 */
export function inInches(mm: number): string {
	const inches = mmToInch(mm);
	for (const bottom of [1, 2, 4, 8, 16, 32, 64]) {
		const nearest = (Math.round(inches * bottom) / bottom) * 25.4;
		const said = nearest > 0 || mm === 0;
		if (said && Math.abs(nearest - mm) <= NEAR_MM) return `${asFraction(inches, bottom)} in`;
	}
	return `${Number(inches.toFixed(3))} in`;
}

/** Millimetres with at most two decimals, such as `22.23 mm`. In: millimetres, 0 or more. */
export function inMm(mm: number): string {
	// 28.575 lies a hair under itself in binary: the half still goes up
	return `${Math.round(mm * 100 + 1e-6) / 100} mm`;
}

/** Both ways, the unit that the shop shows first in front: `3/4 in (19.05 mm)`. */
export function bothWays(mm: number, first: LengthUnit): string {
	const [before, behind] = first === 'mm' ? [inMm(mm), inInches(mm)] : [inInches(mm), inMm(mm)];
	return `${before} (${behind})`;
}
