import type { SeenText, Spot } from '../photos/seen';
import { parseDisplacement } from '../units';
import { mendFamily } from './family-said';
import { fieldsSeen, type FieldRead } from './label-look';
import { rowsOf, rowText } from './label-rows';
import { agreed, type Agreed } from './label-vote';
import { PLATE_FIELDS, type PlateField } from './plate-fields';

export type Legible = 'clear' | 'fair' | 'poor';

/** What was read for one field, to be accepted or corrected. */
export interface LabelOffer {
	field: PlateField;
	/** As it would be kept; `?` for a character that could not be told. */
	value: string;
	/** The very letters on the label, where the value is worked out from them. */
	read: string;
	legible: Legible;
	spot: Spot;
	/** Other ways to read it, the likelier first. */
	or: string[];
}

export interface LabelReading {
	offers: LabelOffer[];
	/** Everything that was read, line by line. */
	lines: string[];
}

/** A displacement is kept in cc, a family with its point, a code in capitals, a name as it is said. */
function kept(field: PlateField, text: string): string {
	if (field === 'displacementCc') {
		const read = parseDisplacement(text);
		return 'cc' in read ? `${Math.round(read.cc * 10) / 10}` : '';
	}
	if (field === 'emissionFamily') return mendFamily(text.replace(/\s/g, '').toUpperCase());
	return field === 'maker' ? text : text.toUpperCase();
}

function legible({ sure, looks, by }: Agreed, all: number): Legible {
	if (by === 'guess' || sure < 0.6) return 'poor';
	return sure >= 0.85 && looks * 2 > all ? 'clear' : 'fair';
}

function offer(field: PlateField, reads: FieldRead[][]): LabelOffer[] {
	const [best, ...others] = agreed(reads);
	if (!best) return [];
	const value = kept(field, best.text);
	const rest = others.map((one) => kept(field, one.text)).filter((one) => one && one !== value);
	const { text: read, spot } = best;
	const or = [...new Set(rest)].slice(0, 3);
	return value ? [{ field, value, read, legible: legible(best, reads.length), spot, or }] : [];
}

/**
 * What a label says, from the words that were seen on its picture. In: the words of each look with their
 * places; the makers that the shop knows. Out: at most one offer for each field, and all lines of the
 * fullest look. Nothing of it is sure: it is for people to accept or to correct.
 */
export function readLabel({ looks }: SeenText, makers: readonly string[]): LabelReading {
	const rows = looks.map(rowsOf);
	const seen = rows.map((some) => fieldsSeen(some, makers));
	const offers = PLATE_FIELDS.flatMap((field) =>
		offer(
			field,
			seen.map((reads) => reads.filter((read) => read.field === field))
		)
	);
	const fullest = rows.toSorted((a, b) => b.flat().length - a.flat().length)[0] ?? [];
	return { offers, lines: fullest.map(rowText) };
}
