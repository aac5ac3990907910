import type { Label } from './label';

/** The three faces: fixed width for codes, bold for what is read from afar, plain for the rest. */
export type Face = 'code' | 'bold' | 'plain';

export interface Row {
	text: string;
	face: Face;
	/** Size of the letters in mm on a label of 29 mm, and the least that is still read. */
	size: number;
	least: number;
	/** Over how many lines it may run. */
	lines: number;
	/** Rows with a higher rank go first where there is no room. */
	rank: number;
	/** Set in a frame. */
	framed?: boolean;
	/** Stands behind it in the same line. */
	beside?: string;
}

/** Capitals are 0.729 of the size: 5.5 mm letters are 4 mm high. */
export const CODE_LEAST = 5.55;

const code = (text: string, size: number): Row => ({
	...{ text, face: 'code', size, least: CODE_LEAST, lines: 1, rank: 0 }
});
const big = (text: string, size: number, lines = 2): Row => ({
	...{ text, face: 'bold', size, least: 2.8, lines, rank: 1 }
});
const plain = (text: string, rank: number, lines = 1): Row => ({
	...{ text, face: 'plain', size: 3.3, least: 2.4, lines, rank }
});
const caution = (text: string): Row => ({
	...{
		text: text && `⚠ ${text}`,
		face: 'bold',
		size: 2.9,
		least: 2.3,
		lines: 4,
		rank: 2,
		framed: true
	}
});
const foot = (text: string): Row => ({
	...{ text, face: 'plain', size: 2.3, least: 2, lines: 1, rank: 9 }
});

function own(label: Label): Row[] {
	if (label.what === 'blank') return [code(label.code, 9)];
	if (label.what === 'bin') {
		const address = { ...big(label.address, 13, 2), least: 7 };
		const what = [plain(label.purpose, 4, 3), plain(label.place, 5, 2)];
		return [address, ...what, code(label.code, 6.4), caution(label.caution)];
	}
	if (label.what === 'box') {
		const what = [big(label.number, 6.4, 1), { ...big(label.engine, 4.2), rank: 3 }];
		return [code(label.code, 8.2), ...what, plain(label.cause, 5, 2), caution(label.caution)];
	}
	const from = [label.donor ?? 'old stock', label.grade].filter(Boolean).join(' · ');
	const what = [
		big(label.name, 4.2),
		plain(label.engine, 4),
		plain(from, 5),
		plain(label.number, 6)
	];
	const bin = { ...big(label.bin ?? '', 5.6, 1), rank: 3 };
	return [code(label.code, 8.2), ...what, bin, caution(label.caution)];
}

/** A part tag where room is short: the bin behind the code, and the facts in one run. */
function tight(label: Label): Row[] {
	if (label.what !== 'part') return own(label);
	const facts = [label.engine, label.donor ?? 'old stock', label.grade, label.number];
	return [
		{ ...code(label.code, 8.2), ...(label.bin ? { beside: label.bin } : {}) },
		{ ...big(label.name, 4.2), least: 2.5 },
		{ ...plain(facts.filter(Boolean).join(' · '), 4, 3), least: 2.2 },
		{ ...caution(label.caution), least: 2.1, framed: false }
	];
}

const said = (rows: Row[], label: Label) =>
	[...rows, foot(label.foot)].filter((row) => row.text.trim() !== '');

/** What stands on a label, from the top, at its best and where room is short; what is empty takes none. */
export const rowsOf = (label: Label): Row[][] => [
	said(own(label), label),
	said(tight(label), label)
];
