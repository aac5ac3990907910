import { PHOTO_SAID } from '$lib/photos/limits';
import { readFile } from 'node:fs/promises';
import sharp from 'sharp';
import { expect, it } from 'vitest';
import { cleanPhoto } from '.';

const fixture = (name: string) =>
	readFile(new URL(`../../../../fixtures/photos/${name}`, import.meta.url));

/** How far two pictures are apart on the average, 0 to 255. */
async function apart(a: Buffer, b: Buffer): Promise<number> {
	const small = (bytes: Buffer) =>
		sharp(bytes).autoOrient().resize(48, 36, { fit: 'fill' }).grayscale().raw().toBuffer();
	const [one, other] = [await small(a), await small(b)];
	return one.reduce((sum, value, at) => sum + Math.abs(value - other[at]!), 0) / one.length;
}

it('a HEIC of a phone becomes a photo like the JPEG of the same view, with nothing beside it', async () => {
	const heic = await fixture('label.heic');
	expect((await sharp(heic).metadata()).exif).toBeDefined();
	const { sizes, width, height } = await cleanPhoto(heic);
	expect([width, height]).toEqual([1200, 900]);
	expect(await apart(sizes.full, await fixture('label.jpg'))).toBeLessThan(6);
	const kept = await sharp(sizes.full).metadata();
	expect(kept.exif ?? kept.xmp ?? kept.icc).toBeUndefined();
});

it('decodes beside the page: other work goes on meanwhile', async () => {
	const heic = await fixture('label.heic');
	let beats = 0;
	const watch = setInterval(() => (beats += 1), 5);
	await Promise.all([1, 2, 3].map(() => cleanPhoto(heic)));
	clearInterval(watch);
	expect(beats).toBeGreaterThan(10);
});

it('one of more than 16 megapixels is refused in words before it is decoded', async () => {
	const began = performance.now();
	await expect(cleanPhoto(await fixture('wide.heic'))).rejects.toMatchObject({
		name: 'Refused',
		message: PHOTO_SAID.heic
	});
	expect(performance.now() - began).toBeLessThan(1000);
});

it('half a HEIC is refused, and the next whole one is decoded', async () => {
	const heic = await fixture('label.heic');
	await expect(cleanPhoto(heic.subarray(0, 9000))).rejects.toMatchObject({ name: 'Refused' });
	expect((await cleanPhoto(heic)).width).toBe(1200);
});
