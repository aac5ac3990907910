import { around, type SeenWord, type Spot } from '../photos/seen';
import { parseDisplacement } from '../units';
import type { PlateField } from './plate-fields';
import { asLetters, headingsOf, slips, type Heading } from './label-headings';
import { joined, rowText, type LabelRow } from './label-rows';

/** One field as one look at a picture has it. */
export interface FieldRead {
	field: PlateField;
	text: string;
	/** How sure each character is, 0 to 1. */
	sure: number[];
	/** Where it stands, its heading with it. */
	spot: Spot;
	/** What says that it is this field. */
	by: 'heading' | 'shape' | 'known' | 'guess';
}

function reads(
	field: PlateField,
	words: readonly SeenWord[],
	by: FieldRead['by'],
	heading: readonly SeenWord[] = []
): FieldRead {
	const text = words.map((word) => word.text).join(' ');
	const sure = words.flatMap((word, at) => (at > 0 ? [1, ...word.sure] : word.sure));
	return { field, text, sure, by, spot: around([...heading, ...words]) };
}

const FAMILY = /^[1-9A-HJ-NPR-TV-Y?][0-9A-Z?]{3}[A-Z?]\.?[0-9A-Z?]{3,4}[0-9A-Z?]{2,3}$/;
export const isFamily = (text: string): boolean => {
	const bare = text.toUpperCase();
	return /^.{11,12}$/.test(bare) && FAMILY.test(bare) && /\d/.test(bare);
};

/** What may stand under a heading; anything else is a misreading or another thing. */
const MAY_BE: Record<PlateField, (text: string) => boolean> = {
	maker: (text) => /\p{L}{3}/u.test(text),
	model: (text) => /[0-9A-Z].*[0-9A-Z]/i.test(text),
	typeCode: (text) => /\d/.test(text),
	dateCode: (text) => /\d/.test(text),
	serial: (text) => /\d/.test(text) && text.length >= 4,
	displacementCc: (text) => 'cc' in parseDisplacement(text),
	emissionFamily: (text) => isFamily(text.replace(/\s/g, ''))
};

const overlaps = (word: Spot, from: number, to: number) =>
	word.x + word.wide / 2 >= from && word.x + word.wide / 2 < to;

/** What stands under a heading, in its column of the next row. */
function below(rows: LabelRow[], at: number, heading: Heading, next: Heading | undefined) {
	const row = rows[at]!;
	const under = rows[at + 1] ?? [];
	if (headingsOf(under).length > 0) return [];
	const start = row[heading.from]!;
	const gap = around(under.length > 0 ? under : [start]).y - (start.y + start.high);
	if (gap > start.high * 4) return [];
	const to = next ? row[next.from]!.x : Infinity;
	return joined(under.filter((word) => overlaps(word, start.x - start.wide / 2, to)));
}

/** The longest beginning that can be this field: what follows it on the line is another thing. */
function fitting(field: PlateField, words: SeenWord[]): SeenWord[] {
	for (let most = words.length; most > 0; most -= 1) {
		const some = words.slice(0, most);
		if (MAY_BE[field](some.map((word) => word.text).join(' '))) return some;
	}
	return [];
}

function headed(rows: LabelRow[]): FieldRead[] {
	return rows.flatMap((row, at) => {
		const headings = headingsOf(row);
		return headings.flatMap((heading, n) => {
			const { field, from, to } = heading;
			if (field === 'other') return [];
			const next = headings[n + 1];
			const right = joined(row.slice(to, next?.from));
			const words = fitting(field, right.length > 0 ? right : below(rows, at, heading, next));
			return words.length > 0 ? [reads(field, words, 'heading', row.slice(from, to))] : [];
		});
	});
}

/** With its displacement in figures, so that a word of a dozen letters is none. */
const SURELY_FAMILY = /^[1-9A-HJ-NPR-TV-Y][0-9A-Z]{3}[A-Z]\.?[0-9]{3,4}[0-9A-Z]{3}$/;
const AMOUNT = /^\d{2,4}([.,]\d{1,2})?(cc|ccm|cm3|cm³|cu\.?in\.?|in3|in³|cid)$/i;

/** What is known by its shape alone: an emission family, a displacement with its unit. */
const shaped = (rows: LabelRow[]): FieldRead[] =>
	rows.flatMap((row) =>
		row.flatMap((word, at) => {
			if (SURELY_FAMILY.test(word.text)) return [reads('emissionFamily', [word], 'shape')];
			const some = [1, 2, 3].map((most) => row.slice(at, at + most));
			const amount = some.find((few) => AMOUNT.test(few.map((one) => one.text).join('')));
			return amount ? [reads('displacementCc', amount, 'shape')] : [];
		})
	);

const letters = (text: string) => asLetters(text).replace(/[^\p{L}\p{N}]/gu, '');

/** Makers that the shop has met, however a letter of them was misread. */
const known = (rows: LabelRow[], makers: readonly string[]): FieldRead[] =>
	makers.flatMap((maker) => {
		const name = letters(maker);
		const count = maker.split(/\s+/).length;
		const most = Math.floor(name.length / 5);
		return rows.flatMap((row) =>
			row.flatMap((_, at) => {
				const words = row.slice(at, at + count);
				const off = slips(letters(rowText(words)), name);
				if (off > most || name.length < 3) return [];
				const found = reads('maker', words, 'known');
				return [{ ...found, text: maker, sure: [...maker].map(() => 1 - off * 0.2) }];
			})
		);
	});

const PROSE = /EMISSION|IMPORTANT|CONTROL|INFORMATION|ENGINE|WARNING|CAUTION|DANGER|READ|OIL|FUEL/i;

/** A name in letters that stand out by their height is probably whose engine it is. */
function standsOut(rows: LabelRow[]): FieldRead[] {
	const heights = rows
		.flat()
		.map((word) => word.high)
		.sort((a, b) => a - b);
	const usual = heights[Math.floor(heights.length / 2)] ?? 0;
	const names = rows.filter(
		(row) =>
			/^[\p{L}& .-]{4,}$/u.test(rowText(row)) &&
			!PROSE.test(rowText(row)) &&
			headingsOf(row).length === 0 &&
			Math.max(...row.map((word) => word.high)) > usual * 1.3
	);
	return names.slice(0, 1).map((row) => reads('maker', row, 'guess'));
}

/** Every field that one look at a label has, some of them more than once. */
export function fieldsSeen(rows: LabelRow[], makers: readonly string[]): FieldRead[] {
	const met = known(rows, makers);
	return [...headed(rows), ...shaped(rows), ...met, ...(met.length > 0 ? [] : standsOut(rows))];
}
