/** What a photo is shrunk to before it is sent: what the shop keeps, and no more bytes than these. */
export const SENT_SIDE = 2048;
export const SENT_BYTES = 350 * 1024;
/** The side of the picture that stands for it on the phone, in points. */
export const THUMB_SIDE = 256;
/** Tried in turn until it is small enough; the last one is sent as it is. */
export const QUALITIES = [0.82, 0.7, 0.58, 0.45] as const;

/** A picture inside a square, never larger than it was; whole points, at least one. */
export function inside(width: number, height: number, side: number) {
	const share = Math.min(1, side / Math.max(width, height));
	return {
		width: Math.max(1, Math.round(width * share)),
		height: Math.max(1, Math.round(height * share))
	};
}
