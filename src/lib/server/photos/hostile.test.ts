import { PHOTO_BYTES, PHOTO_SAID } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import { randomBytes } from 'node:crypto';
import sharp from 'sharp';
import { describe, expect, it } from 'vitest';
import { cleanPhoto } from '.';

const plain = (width: number, height: number) =>
	sharp({ create: { width, height, channels: 3, background: '#8a5a2b' } });

const refusal = (bytes: Buffer) => cleanPhoto(bytes).catch((fault: unknown) => fault);

/** A picture with frames below one another, told apart so that no encoder folds them. */
const frames = (count: number) =>
	sharp(randomBytes(8 * 8 * count * 3), {
		raw: { width: 8, height: 8 * count, channels: 3, pageHeight: 8 }
	});

describe('what pretends to be a photo', () => {
	it('a GIF of a thousand frames without end is refused at once', async () => {
		const gif = await frames(1000).gif({ loop: 0 }).toBuffer();
		const began = performance.now();
		expect(await refusal(gif)).toMatchObject({ name: 'Refused', message: PHOTO_SAID.kind });
		expect(performance.now() - began).toBeLessThan(1000);
	});

	it('a moving WebP becomes its first picture', async () => {
		const { width, height, sizes } = await cleanPhoto(await frames(50).webp().toBuffer());
		expect([width, height]).toEqual([8, 8]);
		expect((await sharp(sizes.full).metadata()).pages ?? 1).toBe(1);
	});

	it('a JPEG that is a page or an archive too loses what was hung on', async () => {
		const jpeg = await plain(90, 60).jpeg().toBuffer();
		const page = '<script>canary()</script>';
		const archive = Buffer.concat([Buffer.from('PK\x03\x04'), Buffer.from(page)]);
		const { sizes } = await cleanPhoto(Buffer.concat([jpeg, archive]));
		for (const bytes of Object.values(sizes)) {
			expect(bytes.includes('canary')).toBe(false);
			expect(bytes.includes('PK\x03\x04')).toBe(false);
		}
	});

	it('a page that starts with the first bytes of a JPEG is refused', async () => {
		const page = Buffer.from('\xff\xd8\xff\xe0<html><script>canary()</script>', 'latin1');
		expect(await refusal(page)).toBeInstanceOf(Refused);
	});

	it('30 MB of a real picture are too much', async () => {
		const jpeg = await plain(90, 60).jpeg().toBuffer();
		const padded = Buffer.concat([jpeg, randomBytes(30_000_000 - jpeg.length)]);
		expect(padded.length).toBeGreaterThan(PHOTO_BYTES);
		expect(await refusal(padded)).toMatchObject({ message: PHOTO_SAID.size });
	});

	it('twenty large ones at once neither fill the memory nor stop other answers', async () => {
		const large = await plain(7000, 5000).jpeg().withMetadata({ orientation: 6 }).toBuffer();
		await cleanPhoto(large);
		const before = process.memoryUsage.rss();
		const lags: number[] = [];
		let [most, last] = [0, performance.now()];
		const watch = setInterval(() => {
			lags.push(performance.now() - last - 10);
			last = performance.now();
			most = Math.max(most, process.memoryUsage.rss() - before);
		}, 10);
		const sent = Array.from({ length: 20 }, (_, i) => (i % 4 ? large : Buffer.from('PK\x03\x04')));
		const ends = await Promise.allSettled(sent.map((bytes) => cleanPhoto(bytes)));
		clearInterval(watch);
		expect(ends.filter((end) => end.status === 'fulfilled')).toHaveLength(15);
		expect(most / 2 ** 20).toBeLessThan(200);
		const slow = lags.toSorted((a, b) => a - b)[Math.floor(lags.length * 0.95)];
		expect(slow).toBeLessThan(200);
	}, 60_000);
});
