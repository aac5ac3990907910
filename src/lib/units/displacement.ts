export type DisplacementReading =
	{ cc: number; typed: string } | { problem: 'empty' | 'unreadable' };

const CC_PER_CUBIC_INCH = 16.387064;

/** Cubic inches into cubic centimetres, exactly 16.387064 (NIST SP 811). */
export function cubicInchToCc(cubicInches: number): number {
	return cubicInches * CC_PER_CUBIC_INCH;
}

/** Cubic centimetres into cubic inches, exactly 16.387064 (NIST SP 811). */
export function ccToCubicInch(cc: number): number {
	return cc / CC_PER_CUBIC_INCH;
}

function ccFor(word: string): number | null {
	const unit = word.toLowerCase().replace(/[\s.]/g, '').replace('³', '3').replace('^', '');
	if (/^(|cc|ccm|cm3|ml)$/.test(unit)) return 1;
	if (/^(cuin|in3|ci|cid|cubicinch(es)?|cuinch(es)?)$/.test(unit)) return CC_PER_CUBIC_INCH;
	if (/^(l|litres?|liters?)$/.test(unit)) return 1000;
	return null;
}

/**
 * A displacement as people type it, into cubic centimetres: `210cc`, `12.9 cu in`, `0.42 l`; a
 * number alone is cc. Out: cc and what was typed; or that it is empty or cannot be read. Never
 * throws.
 */
export function parseDisplacement(typed: string): DisplacementReading {
	const text = typed.trim();
	if (text === '') return { problem: 'empty' };
	const found = /^(\d*[.,]?\d+)\s*(\D.*)?$/u.exec(text);
	const each = found && ccFor(found[2] ?? '');
	const count = Number((found?.[1] ?? '').replace(',', '.'));
	if (!each || !Number.isFinite(count) || count === 0) return { problem: 'unreadable' };
	return { cc: count * each, typed: text };
}
