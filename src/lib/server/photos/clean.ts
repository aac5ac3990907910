import { PHOTO_BYTES, PHOTO_PIXELS, PHOTO_SAID } from '$lib/photos/limits';
import type { PhotoSize } from '$lib/photos/links';
import { Refused } from '$lib/refusal';
import sharp, { type Metadata } from 'sharp';
import { turns } from './turns';

export interface CleanPhoto {
	width: number;
	height: number;
	sizes: Record<PhotoSize, Buffer>;
}

const FULL = 2048;
const CARD = 640;
const THUMB_BYTES = 15 * 1024;
/** Tried in turn until a thumb is small enough for a list of two dozen on a slow line. */
const THUMBS = [
	{ side: 200, quality: 70 },
	{ side: 200, quality: 45 },
	{ side: 200, quality: 20 },
	{ side: 140, quality: 20 },
	{ side: 96, quality: 10 }
];

// Uploads differ, so what the last one left is only memory held.
sharp.cache(false);

/** A decoded picture may take a quarter of a gigabyte, so no more than two at a time. */
const turn = turns(2);

const refuse = (why: keyof typeof PHOTO_SAID): never => {
	throw new Refused('bad input', PHOTO_SAID[why], 'file');
};

const open = (bytes: Buffer) => sharp(bytes, { limitInputPixels: PHOTO_PIXELS, failOn: 'warning' });

const tooManyPixels = (fault: unknown) =>
	fault instanceof Error && /pixel limit/i.test(fault.message);

/** What the bytes say they are; the name and the type sent with them count for nothing. */
async function look(bytes: Buffer): Promise<Metadata> {
	try {
		return await open(bytes).metadata();
	} catch (fault) {
		return refuse(tooManyPixels(fault) ? 'pixels' : 'kind');
	}
}

async function check(bytes: Buffer): Promise<void> {
	if (bytes.length > PHOTO_BYTES) refuse('size');
	const { format, compression } = await look(bytes);
	if (format === 'heif') {
		if (compression !== 'av1') refuse('heic');
	} else if (!['jpeg', 'png', 'webp'].includes(format)) refuse('kind');
}

async function thumbOf(card: Buffer): Promise<Buffer> {
	let thumb = card;
	for (const { side, quality } of THUMBS) {
		thumb = await sharp(card)
			.resize(side, side, { fit: 'inside', withoutEnlargement: true })
			.webp({ quality })
			.toBuffer();
		if (thumb.length <= THUMB_BYTES) break;
	}
	return thumb;
}

/**
 * One decode of the upload; upright, in plain colours, without a byte of what the camera wrote beside the
 * picture. The smaller sizes come from the larger, so that no raw picture waits in memory.
 */
async function draw(bytes: Buffer): Promise<CleanPhoto> {
	const { data: full, info } = await open(bytes)
		.autoOrient()
		.resize(FULL, FULL, { fit: 'inside', withoutEnlargement: true })
		.webp({ quality: 80 })
		.toBuffer({ resolveWithObject: true });
	const card = await sharp(full)
		.resize(CARD, CARD, { fit: 'inside', withoutEnlargement: true })
		.webp({ quality: 75 })
		.toBuffer();
	return {
		width: info.width,
		height: info.height,
		sizes: { full, card, thumb: await thumbOf(card) }
	};
}

/** Makes the sizes that screens need out of an upload, or refuses it in words. */
export const cleanPhoto = (bytes: Buffer): Promise<CleanPhoto> =>
	turn(async () => {
		await check(bytes);
		try {
			return await draw(bytes);
		} catch (fault) {
			return refuse(tooManyPixels(fault) ? 'pixels' : 'broken');
		}
	});
