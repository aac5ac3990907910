import sharp from 'sharp';

const FRAME = { width: 640, height: 480 };

/** A label as a camera sees it that is held over it: on a bench, not quite straight. */
const frame = async (label: Buffer, turn: number): Promise<Buffer> => {
	const seen = await sharp(label)
		.resize({ width: 500, height: 380, fit: 'inside' })
		.rotate(turn, { background: '#8a8378' })
		.toBuffer();
	return sharp({ create: { ...FRAME, channels: 3, background: '#8a8378' } })
		.composite([{ input: seen }])
		.jpeg({ quality: 60 })
		.toBuffer();
};

/** A film for the camera of a test, of labels one after the other: JPEG pictures in a row, thirty a second. */
export async function filmOf(labels: readonly Buffer[], frames: number): Promise<Buffer> {
	const seen = await Promise.all(labels.map((label, at) => frame(label, (at % 5) * 4 - 8)));
	return Buffer.concat(seen.flatMap((picture) => Array<Buffer>(frames).fill(picture)));
}
