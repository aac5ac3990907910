import { drawQr } from '../tags/qr';
import type { Label } from './label';
import { textPieces, WRITE, writeLines, type Box, type Piece } from './piece';
import { rowsOf } from './row';
import { columnHeight, setColumn, type Measure } from './set-text';

/** A dot of a label printer, in mm: eight to the millimetre is what is sold as 203 dpi. */
export const PRINTER_DOT = 0.125;
const HOLE = 5;
const MOST_DOTS = 16;

export interface Size {
	width: number;
	height: number;
}

/** Down to a whole dot, so that no module is blurred over two. */
const onDot = (mm: number) => Math.floor(mm / PRINTER_DOT + 1e-6) * PRINTER_DOT;

/** What a printer leaves white; more on a large label. */
const marginOf = ({ width, height }: Size) =>
	Math.min(4, Math.max(1.5, 0.035 * Math.min(width, height)));
const isUpright = ({ width, height }: Size) => height >= 0.95 * width;
const isTag = (label: Label) => label.what === 'part' || label.what === 'blank';

/** Whole dots to a module, as many as go into the room. */
function qrIn(address: string, room: number) {
	const { size: modules, path } = drawQr(address);
	const dots = Math.min(MOST_DOTS, Math.max(2, Math.floor(room / (modules * PRINTER_DOT) + 1e-6)));
	return { modules, path, dot: dots * PRINTER_DOT, side: modules * dots * PRINTER_DOT };
}

/** How many lines are kept free for the hand, whatever else is to be said. */
function linesKept(label: Label, height: number): number {
	if (label.what === 'blank') return height < 28 ? 1 : height < 50 ? 2 : 4;
	return label.what === 'part' && height >= 34 ? (height < 60 ? 1 : 3) : 0;
}

function column(label: Label, room: Box, measure: Measure): Piece[] {
	const kept = linesKept(label, room.height) * WRITE;
	const most = label.what === 'bin' ? 3 : 2.4;
	const grown = Math.min(most, room.height / 26, room.width / 28);
	const space = { width: room.width, height: room.height - (kept && kept + 1) };
	const set = setColumn(rowsOf(label), space, Math.max(0.7, grown), measure);
	const used = columnHeight(set);
	const under = { ...room, y: room.y + used + 1, height: room.height - used - 1 };
	return [...textPieces(set, room), ...(isTag(label) ? writeLines(under, 6) : [])];
}

/** A ring of 5 mm where a tag gets its hole. */
const hole = (x: number, y: number): Piece => ({
	...{ what: 'hole', x: x - HOLE / 2, y: y - HOLE / 2, width: HOLE, height: HOLE }
});

/** Beside each other: the hole of a tag, what is read by eye, the code. */
function lying(label: Label, address: string, size: Size, measure: Measure): Piece[] {
	const margin = marginOf(size);
	const holed = isTag(label) && size.width >= 56;
	const left = holed ? HOLE + 1 + margin : margin;
	const share = size.width < 56 ? 0.42 : 0.44;
	const { side, ...qr } = qrIn(address, Math.min(size.height, share * size.width));
	const x = onDot(size.width - side);
	const y = onDot((size.height - side) / 2);
	const text = { x: left, y: margin, width: x - left - 0.5, height: size.height - 2 * margin };
	return [
		{ what: 'qr', x, y, width: side, height: side, ...qr },
		...(holed ? [hole(margin + HOLE / 2, size.height / 2)] : []),
		...column(label, text, measure)
	];
}

/** Under each other: the hole of a tag, what is read by eye, the code with lines beside it. */
function upright(label: Label, address: string, size: Size, measure: Measure): Piece[] {
	const margin = marginOf(size);
	const holed = isTag(label) && size.height >= 80;
	const top = margin + (holed ? HOLE + 2 : 0);
	const { side, ...qr } = qrIn(address, Math.min(0.5 * size.width, 0.5 * (size.height - top)));
	const x = onDot(size.width - side);
	const y = onDot(size.height - side);
	const text = { x: margin, y: top, width: size.width - 2 * margin, height: y - top - 0.5 };
	const beside = { x: margin, y, width: x - margin - 1, height: side - margin };
	return [
		{ what: 'qr', x, y, width: side, height: side, ...qr },
		...(holed ? [hole(size.width / 2, margin + HOLE / 2)] : []),
		...column(label, text, measure),
		...(isTag(label) && beside.width > 20 ? writeLines(beside, 6) : [])
	];
}

/** Where everything of a label goes on a stock of this size. */
export const layOut = (label: Label, address: string, size: Size, measure: Measure): Piece[] =>
	(isUpright(size) ? upright : lying)(label, address, size, measure);
