import { PHOTO_SAID } from '$lib/photos/limits';
import { PHOTO_SIZES } from '$lib/photos/links';
import { NotFound, Refused } from '$lib/refusal';
import { randomBytes } from 'node:crypto';
import { buffer } from 'node:stream/consumers';
import { deflateSync } from 'node:zlib';
import { and, eq } from 'drizzle-orm';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { NOON, testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import {
	addDonorPhoto,
	putBackDonorPhoto,
	removeDonorPhoto,
	removedDonorPhotos,
	takeIn
} from '../donors';
import { listKeys } from '../storage';
import { cleanPhoto, deletePhoto, keepPhoto, readPhoto, restorePhoto, savePhoto } from '.';
import { sweepPhotos } from './sweep';
import { photo } from './tables';
import { turns } from './turns';

// A bucket of its own: shops of other databases have the same numbers, and the sweep would find theirs.
process.env.S3_BUCKET = `photos-${process.pid}-${Date.now()}`;

let ours: TestShop;
let theirs: TestShop;
beforeAll(async () => {
	({ ours, theirs } = await testShops());
});

const noise = (width: number, height: number) =>
	sharp(randomBytes(width * height * 3), { raw: { width, height, channels: 3 } });

const plain = (width: number, height: number) =>
	sharp({ create: { width, height, channels: 3, background: '#8a5a2b' } });

const crc = (bytes: Buffer) => {
	let sum = 0xffffffff;
	for (const byte of bytes) {
		sum ^= byte;
		for (let bit = 0; bit < 8; bit += 1) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1;
	}
	return (sum ^ 0xffffffff) >>> 0;
};

const chunk = (name: string, data: Buffer) => {
	const head = Buffer.alloc(4);
	head.writeUInt32BE(data.length);
	const body = Buffer.concat([Buffer.from(name), data]);
	const tail = Buffer.alloc(4);
	tail.writeUInt32BE(crc(body));
	return Buffer.concat([head, body, tail]);
};

/** A black PNG of side x side points, packed to a few kilobytes. */
function bomb(side: number): Buffer {
	const header = Buffer.alloc(13);
	header.writeUInt32BE(side, 0);
	header.writeUInt32BE(side, 4);
	header[8] = 1;
	const rows = Buffer.alloc((Math.ceil(side / 8) + 1) * side);
	return Buffer.concat([
		Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
		chunk('IHDR', header),
		chunk('IDAT', deflateSync(rows)),
		chunk('IEND', Buffer.alloc(0))
	]);
}

const svg = Buffer.from(
	'<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><rect/></svg>'
);
const zip = Buffer.from('504b0506000000000000000000000000000000000000', 'hex');

describe('what is no photo is refused in words', () => {
	const uploads: [string, () => Promise<Buffer> | Buffer, string][] = [
		['an SVG', () => svg, PHOTO_SAID.kind],
		['a zip named .jpg', () => zip, PHOTO_SAID.kind],
		['a text', () => Buffer.from('<html>hello</html>'), PHOTO_SAID.kind],
		['nothing', () => Buffer.alloc(0), PHOTO_SAID.kind],
		['a GIF', () => plain(20, 20).gif().toBuffer(), PHOTO_SAID.kind],
		['a TIFF', () => plain(20, 20).tiff().toBuffer(), PHOTO_SAID.kind],
		['196 megapixels in a few kilobytes', () => bomb(14_000), PHOTO_SAID.pixels],
		['26 MB', () => Buffer.alloc(26 * 1024 * 1024), PHOTO_SAID.size],
		[
			'half a JPEG',
			async () => (await noise(600, 400).jpeg().toBuffer()).subarray(0, 40_000),
			PHOTO_SAID.broken
		]
	];
	it.each(uploads)('%s', async (_, make, said) => {
		const bytes = await make();
		const began = performance.now();
		const thrown = await cleanPhoto(bytes).catch((fault: unknown) => fault);
		expect(thrown).toBeInstanceOf(Refused);
		expect(thrown).toMatchObject({ code: 'bad input', message: said });
		expect(performance.now() - began).toBeLessThan(1000);
	});
});

describe('a photo', () => {
	it.each(['jpeg', 'png', 'webp', 'avif'] as const)('may be a %s', async (format) => {
		const clean = await cleanPhoto(await plain(300, 200).toFormat(format).toBuffer());
		expect(clean).toMatchObject({ width: 300, height: 200 });
	});

	it('comes out upright and without a byte of what the camera wrote', async () => {
		const gps = { IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } };
		const sent = await noise(400, 300)
			.jpeg()
			.withExif({ IFD0: { Make: 'Canary Camera', Copyright: 'CANARY' }, ...gps })
			.withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"><canary/></x:xmpmeta>')
			.withMetadata({ orientation: 6 })
			.toBuffer();
		expect((await sharp(sent).metadata()).exif).toBeDefined();
		const { sizes, width, height } = await cleanPhoto(sent);
		expect([width, height]).toEqual([300, 400]);
		for (const size of PHOTO_SIZES) {
			const kept = await sharp(sizes[size]).metadata();
			expect(kept.exif ?? kept.xmp ?? kept.iptc ?? kept.icc ?? kept.orientation).toBeUndefined();
			expect(kept.height).toBeGreaterThan(kept.width);
			expect(sizes[size].includes('anary')).toBe(false);
		}
	});

	it('keeps the top at the top when its camera lay on the side', async () => {
		const red = { create: { width: 40, height: 80, channels: 3, background: '#ff0000' } } as const;
		const left = await sharp(red).png().toBuffer();
		const sent = await plain(80, 80)
			.composite([{ input: left, left: 0, top: 0 }])
			.jpeg()
			.withMetadata({ orientation: 6 })
			.toBuffer();
		const { sizes } = await cleanPhoto(sent);
		const { data } = await sharp(sizes.full).raw().toBuffer({ resolveWithObject: true });
		expect(data[0]).toBeGreaterThan(200);
		expect(data[2]).toBeLessThan(60);
		expect(data[data.length - 3]).toBeLessThan(200);
	});

	it.each([1, 2, 3, 4, 5, 6, 7, 8])('is upright from way %i of holding the camera', async (way) => {
		const corner = await plain(20, 12).png().toBuffer();
		const sent = await sharp({ create: { width: 96, height: 64, channels: 3, background: '#fff' } })
			.composite([{ input: corner, left: 0, top: 0 }])
			.withMetadata({ orientation: way })
			.png()
			.toBuffer();
		const small = (bytes: Buffer) =>
			sharp(bytes).resize(24, 24, { fit: 'fill' }).grayscale().raw().toBuffer();
		const wanted = await small(await sharp(sent).autoOrient().png().toBuffer());
		const seen = await small((await cleanPhoto(sent)).sizes.full);
		const off = seen.reduce((most, value, at) => Math.max(most, Math.abs(value - wanted[at]!)), 0);
		expect(off).toBeLessThan(40);
	});

	it('has sizes for screens, the smallest under 15 KB even of noise', async () => {
		const { sizes } = await cleanPhoto(await noise(3000, 2000).jpeg({ quality: 60 }).toBuffer());
		const widest = async (bytes: Buffer) => (await sharp(bytes).metadata()).width;
		expect(await widest(sizes.full)).toBe(2048);
		expect(await widest(sizes.card)).toBe(640);
		expect(await widest(sizes.thumb)).toBeLessThanOrEqual(200);
		expect(sizes.thumb.length).toBeLessThanOrEqual(15 * 1024);
	});
});

it('no more than two are worked on at once', async () => {
	const turn = turns(2);
	let now = 0;
	let most = 0;
	const work = async () => {
		most = Math.max(most, ++now);
		await new Promise((done) => setTimeout(done, 5));
		now -= 1;
	};
	await Promise.all(Array.from({ length: 9 }, () => turn(work)));
	await expect(turn(() => Promise.reject(new Error('no')))).rejects.toThrow('no');
	await Promise.all([turn(work), turn(work), turn(work)]);
	expect(most).toBe(2);
});

describe('in the store', () => {
	const keysOf = async (shop: TestShop) => {
		const keys: string[] = [];
		for await (const { key } of listKeys(`${shop.ctx.shopId}/`)) keys.push(key);
		return keys;
	};
	const rowOf = (id: number) =>
		inShop(ours.ctx, (tx) =>
			tx
				.select()
				.from(photo)
				.where(and(eq(photo.shopId, ours.ctx.shopId), eq(photo.id, id)))
		);
	const picture = () => plain(900, 600).jpeg().toBuffer();
	const days = (count: number) => new Date(NOON.getTime() + count * 86_400_000);

	it('three sizes stand under a fresh key, never the upload itself', async () => {
		const sent = await picture();
		const { id } = await savePhoto(ours.ctx, sent);
		const keys = await keysOf(ours);
		expect(keys.map((key) => key.split('/').at(-1)).sort()).toEqual([
			'card.webp',
			'full.webp',
			'thumb.webp'
		]);
		for (const size of PHOTO_SIZES) {
			const bytes = await buffer(await readPhoto(ours.ctx, id, size));
			expect((await sharp(bytes).metadata()).format).toBe('webp');
			expect(bytes.equals(sent)).toBe(false);
		}
	});

	it('a photo of another shop is not there, like one that never was', async () => {
		const { id } = await savePhoto(theirs.ctx, await picture());
		const foreign = await readPhoto(ours.ctx, id, 'full').catch((fault: unknown) => fault);
		const unknown = await readPhoto(ours.ctx, 999_999, 'full').catch((fault: unknown) => fault);
		expect(foreign).toBeInstanceOf(NotFound);
		expect(foreign).toEqual(unknown);
		await expect(deletePhoto(ours.ctx, id)).rejects.toThrow(NotFound);
	});

	it('one that was taken away can be put back', async () => {
		const { id } = await savePhoto(ours.ctx, await picture());
		await deletePhoto(ours.ctx, id);
		for (const size of ['card', 'full'] as const)
			await expect(readPhoto(ours.ctx, id, size)).rejects.toThrow(NotFound);
		// To be told apart from others that were taken away, by those who can put it back.
		(await readPhoto(ours.ctx, id, 'thumb')).destroy();
		const reader = await ours.as('reader');
		await expect(readPhoto(reader, id, 'thumb')).rejects.toThrow(NotFound);
		await expect(readPhoto(theirs.ctx, id, 'thumb')).rejects.toThrow(NotFound);
		await restorePhoto(ours.ctx, id);
		(await readPhoto(ours.ctx, id, 'card')).destroy();
	});

	it('what was taken off a donor is listed with who did it, until it is back or forgotten', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'TARN-21L' });
		const { id } = await addDonorPhoto(ours.ctx, number, await picture(), 'label');
		expect(await removedDonorPhotos(ours.ctx, number)).toEqual([]);
		const bench = await ours.as('bench');
		await removeDonorPhoto(bench, number, id);
		const [removed] = await removedDonorPhotos(ours.ctx, number);
		expect(removed).toMatchObject({ id, alt: 'label or plate', at: NOON });
		expect(removed?.by).not.toBe('');
		expect(await removedDonorPhotos(ours.at(days(31)), number)).toEqual([]);
		await expect(putBackDonorPhoto(ours.at(days(31)), number, id)).rejects.toThrow(NotFound);
		await putBackDonorPhoto(ours.ctx, number, id);
		expect(await removedDonorPhotos(ours.ctx, number)).toEqual([]);
	});

	it('its row has a tiny picture for the place where it will stand', async () => {
		const { id } = await savePhoto(ours.ctx, await picture());
		const [row] = await rowOf(id);
		const blur = await sharp(Buffer.from(row!.blur, 'base64')).metadata();
		expect([blur.format, blur.width, blur.height]).toEqual(['webp', 16, 11]);
		expect(row!.blur.length).toBeLessThan(400);
	});

	it('is never written to inside a transaction', async () => {
		const sent = await picture();
		await expect(inShop(ours.ctx, (_tx, ctx) => keepPhoto(ctx, sent))).rejects.toThrow(/before/);
	});

	it('one that was taken away thirty days ago is gone, row, ties and bytes', async () => {
		const { number } = await takeIn(ours.ctx, { model: 'TARN-21L' });
		const { id } = await addDonorPhoto(ours.ctx, number, await picture(), 'front');
		await deletePhoto(ours.ctx, id);
		const [row] = await rowOf(id);
		const after = (count: number) => ours.at(days(count));
		await sweepPhotos(after(29));
		expect(await rowOf(id)).toHaveLength(1);
		await sweepPhotos(after(31));
		expect(await rowOf(id)).toHaveLength(0);
		await sweepPhotos({ ...ours.ctx, now: new Date(Date.now() + 61 * 60_000) });
		expect((await keysOf(ours)).some((key) => key.startsWith(row!.key))).toBe(false);
		await expect(restorePhoto(ours.ctx, id)).rejects.toThrow(NotFound);
	});

	it('the sweep removes what has no row after an hour, and nothing else', async () => {
		const stray = await keepPhoto(ours.ctx, await picture());
		const foreign = await keepPhoto(theirs.ctx, await picture());
		const soon = { ...ours.ctx, now: new Date(Date.now() + 59 * 60_000) };
		const later = { ...ours.ctx, now: new Date(Date.now() + 61 * 60_000) };
		expect(await sweepPhotos(soon)).toBe(0);
		expect(await sweepPhotos(later)).toBe(3);
		const left = await keysOf(ours);
		expect(left.some((key) => key.startsWith(stray.key))).toBe(false);
		expect((await keysOf(theirs)).some((key) => key.startsWith(foreign.key))).toBe(true);
		const rows = await inShop(ours.ctx, (tx) =>
			tx.select().from(photo).where(eq(photo.shopId, ours.ctx.shopId))
		);
		expect(left).toHaveLength(rows.length * PHOTO_SIZES.length);
	});
});
