import { inInches, inMm, inchToMm, mmToInch, parseLength, type LengthUnit } from '../../units';
import { apart, type Point } from './geometry';

/** Two points of a picture that lie a known length apart. */
export interface Ruler {
	from: Point;
	to: Point;
	mm: number;
}

/** A length read off a picture: what it is, and how far it may be off either way. */
export interface Reading {
	mm: number;
	offMm: number;
}

/** How far a finger or mouse misses what it points at, in widths of the picture: three dots of two thousand. */
const POINTING = 3 / 2048;
/** What the camera bends, and what lies a little nearer or farther than the ruler. */
const LYING = 0.01;
/** Closer than this, two points make no ruler and no length. */
export const LEAST_APART = 0.01;

/**
 * The length between two points of a picture with a ruler. In: the ruler, the points, and how many times the picture
 * is as high as wide. Out: millimetres, and the tolerance of three roots of squares: pointing at the length,
 * pointing at the ruler, and one in a hundred for the camera. Null where the points of the ruler fall together.
 */
export function readLength(ruler: Ruler, a: Point, b: Point, tall: number): Reading | null {
	const known = apart(ruler.from, ruler.to, tall);
	if (known < LEAST_APART) return null;
	const mm = (apart(a, b, tall) / known) * ruler.mm;
	const pointing = Math.SQRT2 * POINTING;
	const off = Math.hypot((pointing / known) * ruler.mm, (pointing / known) * mm, LYING * mm);
	return { mm, offMm: Math.max(off, 0.1) };
}

/** A typed length of a ruler, in millimetres, or what to type instead. */
export function rulerLength(
	typed: string,
	first: LengthUnit
): { mm: number } | { problem: string } {
	const read = parseLength(typed, first);
	if ('problem' in read)
		return { problem: 'Enter the length between the two points like 3/4", 2 7/16 or 25 mm' };
	if (read.mm < 1 || read.mm > 5000)
		return { problem: 'Enter a length between 1 mm and 5 m, like 2 in or 50 mm' };
	return { mm: read.mm };
}

const tenths = (mm: number) => Math.round(mm * 10) / 10;

/** 61.7 mm ±0.8, in the unit that the shop shows first, and the other behind. */
export function sayReading({ mm, offMm }: Reading, first: LengthUnit): string {
	const metric = `${tenths(mm)} mm ±${tenths(offMm)}`;
	const inches = `${mmToInch(mm).toFixed(2)} in ±${mmToInch(offMm).toFixed(2)}`;
	return first === 'mm' ? `${metric} (${inches})` : `${inches} (${metric})`;
}

export interface Usual {
	mm: number;
	said: string;
}

/**
 * The usual sizes that a reading may be: whole millimetres and fractions of an inch, as coarse as the tolerance
 * allows; the nearest first, at most four. None when nothing usual lies within the tolerance.
 */
export function usualSizes({ mm, offMm }: Reading, first: LengthUnit): Usual[] {
	const fraction = (bottom: number) => inchToMm(Math.round(mmToInch(mm) * bottom) / bottom);
	const metric = [Math.round(mm), Math.round(mm / 5) * 5].map((size) => ({
		mm: size,
		said: inMm(size)
	}));
	const inch = [2, 4, 8, 16, 32].map(fraction).map((size) => ({ mm: size, said: inInches(size) }));
	const all = first === 'mm' ? [...metric, ...inch] : [...inch, ...metric];
	const within = all.filter((size) => size.mm > 0 && Math.abs(size.mm - mm) <= offMm);
	const once = within.filter(
		(size, at) => within.findIndex((one) => one.said === size.said) === at
	);
	return once.sort((a, b) => Math.abs(a.mm - mm) - Math.abs(b.mm - mm)).slice(0, 4);
}

/** How a measured length is written on its part: what was measured, the size, and how it was read. */
export function measureLine(what: string, reading: Reading, asMm: number | null): string {
	const read = `${tenths(reading.mm)} mm ±${tenths(reading.offMm)} off a photo`;
	const size = asMm === null ? '' : `${inInches(asMm)}, ${inMm(asMm)}: `;
	return `${what} ${size}${read}`;
}
