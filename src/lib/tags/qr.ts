import { encode } from 'uqr';

/** The address that a printed code carries: upper case, which packs it into fewer and larger modules. */
export const scanAddress = (origin: string, shopSlug: string, tag: string): string =>
	`${origin}/T/${shopSlug}/${tag}`.toUpperCase();

export interface QrDrawing {
	/** Modules along a side, the quiet zone of four on each side included. */
	size: number;
	/** The dark modules, as the path of an SVG of that size: one box for each run in a row. */
	path: string;
}

function runsOf(row: readonly boolean[], y: number): string {
	let path = '';
	for (let x = 0; x < row.length; x += 1) {
		if (!row[x]) continue;
		let end = x;
		while (row[end]) end += 1;
		path += `M${x} ${y}h${end - x}v1h-${end - x}z`;
		x = end;
	}
	return path;
}

/** A QR code at level Q: it still reads with a quarter of it smeared. */
export function drawQr(text: string): QrDrawing {
	const { data, size } = encode(text, { ecc: 'Q', border: 4, boostEcc: false });
	return { size, path: data.map(runsOf).join('') };
}
