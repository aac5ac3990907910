import { broken, shortened } from './lines';
import type { Face, Row } from './row';

/** How wide a text is, in sizes of its letters. */
export type Measure = (text: string, face: Face) => number;

export interface SetRow {
	row: Row;
	size: number;
	lines: string[];
	height: number;
	/** What stands behind the line: where it begins, its size, how wide it may be. */
	beside?: { text: string; x: number; size: number; width: number };
}

/** What a line of letters takes in height, and where its foot stands, in sizes. A code has no tails. */
const LEADING: Record<Face, number> = { code: 0.84, bold: 1.17, plain: 1.17 };
export const BASELINE: Record<Face, number> = { code: 0.78, bold: 0.93, plain: 0.93 };
export const lineHeight = (face: Face, size: number): number => size * LEADING[face];

/** Room inside a frame, in sizes. */
export const FRAME = 0.3;
const GAP = 0.12;

/** What stands behind a line, as large as there is room, in the bold face. */
function besideOf(row: Row, size: number, width: number, measure: Measure) {
	if (!row.beside) return {};
	const x = (measure(row.text, row.face) + 0.3) * size;
	const room = Math.max(0.1, width - x);
	const fitted = Math.min(size, room / measure(row.beside, 'bold'));
	return fitted < BESIDE_LEAST
		? null
		: { beside: { text: row.beside, x, size: fitted, width: room } };
}

const BESIDE_LEAST = 3.2;
const SMALLER = 0.94;

/** A row set in a column so wide, at a size or below. What does not fit its lines ends in three dots. */
export function setRow(row: Row, wanted: number, width: number, measure: Measure): SetRow {
	const least = Math.min(row.least, row.size);
	let size = Math.max(least, wanted);
	const fits = (text: string) =>
		(measure(text, row.face) + (row.framed ? 2 * FRAME : 0)) * size <= width + 1e-9;
	const whole = () =>
		row.text.split(/\s+/).every(fits) && broken(row.text, fits).length <= row.lines;
	while (size > least && !(whole() && besideOf(row, size, width, measure)))
		size = Math.max(least, size * SMALLER);
	const lines = shortened(broken(row.text, fits), row.lines, fits);
	const frame = row.framed ? 2 * FRAME * size : 0;
	const height = lines.length * lineHeight(row.face, size) + frame;
	return { row, size, lines, height, ...besideOf(row, size, width, measure) };
}

const STEPS = 24;

interface Room {
	width: number;
	height: number;
}

/** The first of the ways to say it that goes in, as large as it does. */
function setWhole(ways: readonly Row[][], room: Room, grown: number, measure: Measure) {
	for (const rows of ways) {
		if (rows.some((row) => besideOf(row, row.least, room.width, measure) === null)) continue;
		for (let step = 0; step <= STEPS; step += 1) {
			const scale = grown * (1 - (0.6 * step) / STEPS);
			const set = rows.map((row) => setRow(row, row.size * scale, room.width, measure));
			if (columnHeight(set) <= room.height + 1e-9) return set;
		}
	}
	return null;
}

/** What does not go behind a row gets a line of its own. */
const apart = (row: Row): Row[] => {
	const { beside, ...rest } = row;
	return beside
		? [rest, { ...rest, face: 'bold', text: beside, size: 4, least: 2.8, rank: 3 }]
		: [row];
};

/** Rows under each other in a column; where even the least do not go in, the last in rank go. */
export function setColumn(
	ways: readonly Row[][],
	room: Room,
	grown: number,
	measure: Measure
): SetRow[] {
	const set = setWhole(ways, room, grown, measure);
	if (set) return set;
	const rows = ways.at(-1)!;
	if (rows.some((row) => besideOf(row, row.least, room.width, measure) === null))
		return setColumn([rows.flatMap(apart)], room, grown, measure);
	if (rows.length <= 1) return rows.map((row) => setRow(row, row.least, room.width, measure));
	const out = rows.reduce((worst, row) => (row.rank >= worst.rank ? row : worst));
	return setColumn([rows.filter((row) => row !== out)], room, grown, measure);
}

export const gapOf = ({ size }: SetRow): number => Math.max(0.25, size * GAP);

export const columnHeight = (set: readonly SetRow[]): number =>
	set.reduce((sum, one, at) => sum + one.height + (at ? gapOf(one) : 0), 0);
