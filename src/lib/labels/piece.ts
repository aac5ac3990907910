import type { Face } from './row';
import { BASELINE, FRAME, gapOf, lineHeight, type SetRow } from './set-text';

/** Millimetres from the upper left corner of the label. */
export interface Box {
	x: number;
	y: number;
	width: number;
	height: number;
}

export type Piece = Box &
	(
		| { what: 'qr'; path: string; modules: number; dot: number }
		| { what: 'text'; text: string; face: Face; size: number; baseline: number }
		| { what: 'frame' }
		| { what: 'hole' }
		/** To write on by hand. */
		| { what: 'line' }
	);

/** From one line to write on to the next, in mm. */
export const WRITE = 7;

/** Rows under each other, from the top of their column. */
export function textPieces(set: readonly SetRow[], column: Box): Piece[] {
	const pieces: Piece[] = [];
	let y = column.y;
	set.forEach((one, at) => {
		if (at) y += gapOf(one);
		if (one.row.framed)
			pieces.push({ what: 'frame', x: column.x, y, width: column.width, height: one.height });
		pieces.push(...rowPieces(one, { ...column, y }));
		y += one.height;
	});
	return pieces;
}

function rowPieces({ row, size, lines, beside }: SetRow, at: Box): Piece[] {
	const { face, framed } = row;
	const inset = framed ? FRAME * size : 0;
	const height = lineHeight(face, size);
	const x = at.x + inset;
	const width = (beside ? beside.x : at.width) - 2 * inset;
	const said = lines.map((text, line): Piece => {
		const y = at.y + inset + line * height;
		const baseline = y + BASELINE[face] * size;
		return { what: 'text', x, y, width, height, text, face, size, baseline };
	});
	if (!beside) return said;
	const behind = { x: at.x + beside.x, y: at.y, width: beside.width, height };
	const baseline = at.y + BASELINE[face] * size;
	const { text, size: bold } = beside;
	return [...said, { what: 'text', ...behind, text, face: 'bold', size: bold, baseline }];
}

/** Lines to write on by hand, from the foot of a room upwards. */
export function writeLines(room: Box, most: number): Piece[] {
	const count = Math.min(most, Math.floor(room.height / WRITE));
	return Array.from({ length: Math.max(0, count) }, (_, at) => {
		const y = room.y + room.height - 0.3 - at * WRITE;
		return { what: 'line', x: room.x, y, width: room.width, height: 0.3 };
	});
}
