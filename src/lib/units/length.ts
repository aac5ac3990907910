export type LengthUnit = 'inch' | 'mm';
export type LengthReading =
	{ mm: number; unit: LengthUnit; typed: string } | { problem: 'empty' | 'unreadable' };

const MM_PER_INCH = 25.4;
const GLYPHS: Record<string, string> = {
	...{ '½': '1/2', '¼': '1/4', '¾': '3/4', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8' }
};
const SHAPE =
	/^(?:(?<whole>\d+)[\s-]+)?(?<top>\d+)\/(?<bottom>\d+)\s*(?<fractionUnit>.*)$|^(?<plain>\d*[.,]?\d+|\d+[.,])\s*(?<plainUnit>.*)$/u;

/** Inches into millimetres, exactly 25.4 (NIST SP 811). */
export function inchToMm(inches: number): number {
	return inches * MM_PER_INCH;
}

/** Millimetres into inches, exactly 25.4 (NIST SP 811). */
export function mmToInch(mm: number): number {
	return mm / MM_PER_INCH;
}

// what one of the unit is in millimetres
function unitOf(word: string, unmarked: LengthUnit): { unit: LengthUnit; mm: number } | null {
	const unit = word.toLowerCase().replace(/\.$/, '');
	if (unit === '') return { unit: unmarked, mm: unmarked === 'mm' ? 1 : MM_PER_INCH };
	if (/^(in|inch|inches|"|″|”|'')$/.test(unit)) return { unit: 'inch', mm: MM_PER_INCH };
	if (/^(mm|millimet(er|re)s?)$/.test(unit)) return { unit: 'mm', mm: 1 };
	if (/^(cm|centimet(er|re)s?)$/.test(unit)) return { unit: 'mm', mm: 10 };
	return null;
}

/**
 * A length as people type it, into millimetres: `3/4`, `1-1/8`, `2 7/16 in`, `0.75"`, `25 mm`,
 * `25,4mm`, `2.5 cm`. A fraction without a unit is inches; a plain number without one is in the
 * unit that the shop shows first. In: the text and that unit. Out: millimetres, the unit it was
 * given in and what was typed; or that it is empty or cannot be read. Never throws.
 */
export function parseLength(typed: string, shownFirst: LengthUnit): LengthReading {
	const text = typed.replace(/[½¼¾⅛⅜⅝⅞]/g, (glyph) => ` ${GLYPHS[glyph] ?? ''}`).trim();
	if (text === '') return { problem: 'empty' };
	const found = SHAPE.exec(text)?.groups;
	if (!found) return { problem: 'unreadable' };
	const fraction = found.top !== undefined;
	const unit = unitOf(
		(fraction ? found.fractionUnit : found.plainUnit) ?? '',
		fraction ? 'inch' : shownFirst
	);
	const count = fraction
		? Number(found.whole ?? 0) + Number(found.top) / Number(found.bottom)
		: Number((found.plain ?? '').replace(',', '.'));
	if (!unit || !Number.isFinite(count)) return { problem: 'unreadable' };
	return { mm: count * unit.mm, unit: unit.unit, typed: typed.trim() };
}
