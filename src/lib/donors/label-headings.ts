import { follows, type LabelRow } from './label-rows';
import type { PlateField } from './plate-fields';

/** What a heading on a label announces; `other` is nothing that a donor keeps. */
export interface Heading {
	field: PlateField | 'other';
	/** Where it begins in its row, and the first word after it. */
	from: number;
	to: number;
}

const WORDS: Record<string, PlateField | 'other'> = {
	...{ MAKER: 'maker', MANUFACTURER: 'maker', MFR: 'maker' },
	...{ MODEL: 'model', MOD: 'model' },
	...{ TYPE: 'typeCode', SPEC: 'typeCode', VARIANT: 'typeCode' },
	...{ CODE: 'dateCode', DATE: 'dateCode', DOM: 'dateCode', BUILT: 'dateCode' },
	...{ SERIAL: 'serial', 'S/N': 'serial', SN: 'serial', SER: 'serial' },
	...{ DISPLACEMENT: 'displacementCc', DISPL: 'displacementCc', DISP: 'displacementCc' },
	...{ FAMILY: 'emissionFamily' },
	...{ HOURS: 'other', PERIOD: 'other', POWER: 'other', SPEED: 'other', RPM: 'other' }
};
/** In front of a heading they belong to it, and some turn it into another. */
const BEFORE = ['ENGINE', 'EMISSION', 'EMISSIONS', 'EXHAUST', 'EXH', 'EPA', 'DATE', 'BUILD', 'MFG'];
const TURNS = ['EVAP', 'EVAPORATIVE', 'FUEL', 'OIL', 'PLUG', 'TANK', 'EVP'];
const AFTER = ['NO', 'NUMBER', 'NUM', 'NR', 'CODE', 'OF', 'MANUFACTURE', 'NAME'];

const SWAPS: Record<string, string> = { '0': 'O', '1': 'I', '5': 'S', '8': 'B', '6': 'G' };
/** Figures that are taken for the letters they look like. */
export const asLetters = (text: string): string =>
	text.toUpperCase().replace(/[01568]/g, (digit) => SWAPS[digit] ?? digit);
const fold = (text: string) => asLetters(text).replace(/[^A-Z/]/g, '');

/** How many characters have to be changed, put in or left out to make one text the other; up to 9. */
export function slips(one: string, other: string): number {
	if (Math.abs(one.length - other.length) > 9) return 9;
	let row = Array.from({ length: other.length + 1 }, (_, at) => at);
	for (let i = 1; i <= one.length; i += 1) {
		const next = [i];
		for (let j = 1; j <= other.length; j += 1) {
			const swap = row[j - 1]! + Number(one[i - 1] !== other[j - 1]);
			next.push(Math.min(swap, row[j]! + 1, next[j - 1]! + 1));
		}
		row = next;
	}
	return Math.min(row[other.length]!, 9);
}

const allowed = (word: string) => (word.length >= 8 ? 2 : word.length >= 4 ? 1 : 0);
const isOne = (text: string, list: readonly string[]) =>
	list.find((word) => slips(fold(text), word) <= allowed(word)) !== undefined;

function announced(text: string): PlateField | 'other' | null {
	const folded = fold(text);
	// a code of figures folds into letters too
	if (text.replace(/[^0-9]/g, '').length > 2) return null;
	const exact = WORDS[folded];
	if (exact) return exact;
	const known = Object.keys(WORDS).filter((word) => slips(folded, word) <= allowed(word));
	return known.length > 0 ? WORDS[known[0]!]! : null;
}

/** A word in front that belongs to the heading after it, and one behind that belongs to the one before. */
const leads = (row: LabelRow, at: number) =>
	isOne(row[at]!.text, [...BEFORE, ...TURNS]) && follows(row[at]!, row[at + 1]!);
const trails = (row: LabelRow, at: number) =>
	isOne(row[at]!.text, AFTER) && follows(row[at - 1]!, row[at]!);

/** The headings of a row, from left to right, each with the words that belong to it. */
export function headingsOf(row: LabelRow): Heading[] {
	const found: Heading[] = [];
	for (let at = 0; at < row.length; at += 1) {
		let field = announced(row[at]!.text);
		if (field === null) continue;
		const taken = found.at(-1)?.to ?? 0;
		let from = at;
		while (from > taken && leads(row, from - 1)) {
			from -= 1;
			if (isOne(row[from]!.text, TURNS)) field = 'other';
		}
		let to = at + 1;
		while (to < row.length && trails(row, to)) to += 1;
		found.push({ field, from, to });
		at = to - 1;
	}
	return found;
}
