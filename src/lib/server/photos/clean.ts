import { HEIC_PIXELS, PHOTO_BYTES, PHOTO_PIXELS, PHOTO_SAID } from '$lib/photos/limits';
import type { PhotoSize } from '$lib/photos/links';
import { Refused } from '$lib/refusal';
import sharp, { type Metadata, type Sharp } from 'sharp';
import { decodeHeic } from './heic';
import { turns } from './turns';

export interface CleanPhoto {
	width: number;
	height: number;
	/** A dozen points of it in base64, for the place where it will stand. */
	blur: string;
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

/** Whether the upload is a photo that can be kept, and if so whether it is a HEIC. */
async function check(bytes: Buffer): Promise<{ heic: boolean }> {
	if (bytes.length > PHOTO_BYTES) refuse('size');
	const { format, compression, width, height } = await look(bytes);
	const heic = format === 'heif' && compression !== 'av1';
	if (heic && width * height > HEIC_PIXELS) refuse('heic');
	if (!['jpeg', 'png', 'webp', 'heif'].includes(format)) refuse('kind');
	return { heic };
}

/** The upload on its way to becoming sizes: upright. */
async function opened(bytes: Buffer): Promise<Sharp> {
	const { heic } = await check(bytes);
	if (!heic) return open(bytes).autoOrient();
	const { data, width, height } = await decodeHeic(bytes);
	return sharp(data, { raw: { width, height, channels: 4 } }).removeAlpha();
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

const blurOf = (thumb: Buffer): Promise<Buffer> =>
	sharp(thumb).resize(16, 16, { fit: 'inside' }).webp({ quality: 25, alphaQuality: 0 }).toBuffer();

/**
 * One decode of the upload; upright, in plain colours, without a byte of what the camera wrote beside the
 * picture. The smaller sizes come from the larger, so that no raw picture waits in memory.
 */
async function draw(picture: Sharp, made: Made): Promise<CleanPhoto> {
	const { data: full, info } = await picture
		.resize(FULL, FULL, { fit: 'inside', withoutEnlargement: true })
		.webp({ quality: 80, effort: 2 })
		.toBuffer({ resolveWithObject: true });
	made('full', full);
	const card = await sharp(full)
		.resize(CARD, CARD, { fit: 'inside', withoutEnlargement: true })
		.webp({ quality: 75 })
		.toBuffer();
	made('card', card);
	const thumb = await thumbOf(card);
	made('thumb', thumb);
	return {
		width: info.width,
		height: info.height,
		blur: (await blurOf(thumb)).toString('base64'),
		sizes: { full, card, thumb }
	};
}

/** Hears of each size as soon as it is there. */
type Made = (size: PhotoSize, bytes: Buffer) => void;

/** Makes the sizes that screens need out of an upload, or refuses it in words. */
export const cleanPhoto = (bytes: Buffer, made: Made = () => {}): Promise<CleanPhoto> =>
	turn(async () => {
		try {
			return await draw(await opened(bytes), made);
		} catch (fault) {
			if (fault instanceof Refused) throw fault;
			return refuse(tooManyPixels(fault) ? 'pixels' : 'broken');
		}
	});
