import { encode } from 'uqr';

/** The address that a printed code carries: upper case, which packs it into fewer and larger modules. */
export const scanAddress = (origin: string, shopSlug: string, tag: string): string =>
	`${origin}/T/${shopSlug}/${tag}`.toUpperCase();

export interface QrDrawing {
	/** Modules along a side, the quiet zone of four on each side included. */
	size: number;
	/** The dark modules, as the path of an SVG of that size. */
	path: string;
}

/** A QR code at level Q: it still reads with a quarter of it smeared. */
export function drawQr(text: string): QrDrawing {
	const { data, size } = encode(text, { ecc: 'Q', border: 4, boostEcc: false });
	const path = data
		.flatMap((row, y) => row.map((dark, x) => (dark ? `M${x} ${y}h1v1h-1z` : '')))
		.join('');
	return { size, path };
}
