import { around, type SeenWord, type Spot } from '../photos/seen';

/** Words that stand beside each other on a label, from left to right. */
export type LabelRow = SeenWord[];

const middle = ({ y, high }: Spot) => y + high / 2;

/** Two words stand on one line when the lower half of one does not begin below the other. */
const beside = (one: Spot, other: Spot) =>
	Math.abs(middle(one) - middle(other)) < Math.max(one.high, other.high) * 0.5;

const part = (word: SeenWord, from: number, to: number): SeenWord => {
	const each = word.wide / Math.max(word.text.length, 1);
	return {
		text: word.text.slice(from, to),
		sure: word.sure.slice(from, to),
		x: word.x + each * from,
		y: word.y,
		wide: each * (to - from),
		high: word.high
	};
};

const EDGES = /^[^\p{L}\p{N}.?]+|[^\p{L}\p{N}.?]+$/gu;

/** A word cut where a heading is glued to what it heads, without the marks at its edges. */
function pieces(word: SeenWord): SeenWord[] {
	return [...word.text.matchAll(/[^:=#|[\]{}]+/g)].flatMap((found) => {
		const from = found.index + (/^[^\p{L}\p{N}.?]*/u.exec(found[0])?.[0].length ?? 0);
		const bare = found[0].replace(EDGES, '');
		return /[\p{L}\p{N}]/u.test(bare) ? [part(word, from, from + bare.length)] : [];
	});
}

/** The lines of a label: words put beside each other by where they stand, from the top. */
export function rowsOf(words: readonly SeenWord[]): LabelRow[] {
	const rows: LabelRow[] = [];
	const down = words.flatMap(pieces).sort((a, b) => middle(a) - middle(b));
	for (const word of down) {
		const row = rows.findLast((row) => row.some((other) => beside(word, other)));
		if (row) row.push(word);
		else rows.push([word]);
	}
	for (const row of rows) row.sort((a, b) => a.x - b.x);
	return rows.sort((a, b) => around(a).y - around(b).y);
}

/** How wide a letter of this word is, in shares of the width. */
const letterWide = (word: SeenWord) => word.wide / Math.max(word.text.length, 1);

const GAP = 1.6;

/** Whether a word follows the one before it as in one thing: the gap is that between words, no wider. */
export function follows(before: SeenWord, word: SeenWord): boolean {
	const gap = word.x - (before.x + before.wide);
	return gap <= GAP * Math.max(letterWide(before), letterWide(word));
}

/** Words from the first on, up to the first wide gap. */
export function joined(words: readonly SeenWord[]): SeenWord[] {
	const apart = words.findIndex((word, at) => at > 0 && !follows(words[at - 1]!, word));
	return apart < 0 ? [...words] : words.slice(0, apart);
}

export const rowText = (row: LabelRow): string => row.map((word) => word.text).join(' ');
