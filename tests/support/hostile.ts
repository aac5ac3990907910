import { Buffer } from 'node:buffer';
import { readFile } from 'node:fs/promises';
import { crc32, createDeflate } from 'node:zlib';
import sharp from 'sharp';
import { PHOTO_SAID } from '../../src/lib/photos/limits';

/** A file that is no photo, or more than one, and what the shop says to it; null where it is cleaned. */
export interface Hostile {
	name: string;
	bytes: Buffer;
	said: string | null;
}

const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

function chunk(name: string, data: Buffer): Buffer {
	const [head, tail] = [Buffer.alloc(4), Buffer.alloc(4)];
	const body = Buffer.concat([Buffer.from(name), data]);
	head.writeUInt32BE(data.length);
	tail.writeUInt32BE(crc32(body));
	return Buffer.concat([head, body, tail]);
}

/** So many rows of nothing, packed without ever being there at once. */
async function packedRows(rows: number, length: number): Promise<Buffer> {
	const deflate = createDeflate({ level: 9 });
	const packed: Buffer[] = [];
	deflate.on('data', (bytes: Buffer) => packed.push(bytes));
	const ended = new Promise((done) => deflate.once('end', done));
	const some = Buffer.alloc(length * 100);
	for (let row = 0; row < rows; row += 100)
		if (!deflate.write(some)) await new Promise((done) => deflate.once('drain', done));
	deflate.end();
	await ended;
	return Buffer.concat(packed);
}

/** A black PNG of side x side points in a few hundred kilobytes. */
export async function pngBomb(side: number): Promise<Buffer> {
	const header = Buffer.alloc(13);
	header.writeUInt32BE(side, 0);
	header.writeUInt32BE(side, 4);
	header[8] = 8;
	const rows = await packedRows(side, side + 1);
	return Buffer.concat([
		SIGNATURE,
		...[chunk('IHDR', header), chunk('IDAT', rows), chunk('IEND', Buffer.alloc(0))]
	]);
}

const noise = (width: number, height: number) =>
	sharp({
		create: {
			...{ width, height, channels: 3, background: '#808080' },
			noise: { type: 'gaussian', mean: 128, sigma: 40 }
		}
	});

const frames = (count: number): Promise<Buffer> =>
	sharp(Buffer.from(Array.from({ length: 192 * count }, (_, at) => (at * 7919) % 251)), {
		raw: { width: 8, height: 8 * count, channels: 3, pageHeight: 8 }
	})
		.gif({ loop: 0 })
		.toBuffer();

const ZIP = Buffer.from('504b0304140000000000', 'hex');
const PAGE = '<!doctype html><script>alert(1)</script>';

/** What is sent to break a shop: each is refused or cleaned. */
export async function hostileFiles(): Promise<Hostile[]> {
	const jpeg = await noise(1600, 1200).jpeg().toBuffer();
	const heic = new URL('../../fixtures/photos/wide.heic', import.meta.url);
	const svg = '<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>';
	return [
		{ name: 'PNG of 196 megapixels', bytes: await pngBomb(14_000), said: PHOTO_SAID.pixels },
		{ name: 'PNG of 289 megapixels', bytes: await pngBomb(17_000), said: PHOTO_SAID.pixels },
		{ name: 'GIF of 1,000 frames', bytes: await frames(1000), said: PHOTO_SAID.kind },
		{ name: 'SVG with a script', bytes: Buffer.from(svg), said: PHOTO_SAID.kind },
		{ name: 'zip named .jpg', bytes: ZIP, said: PHOTO_SAID.kind },
		{ name: 'page named .jpg', bytes: Buffer.from(PAGE), said: PHOTO_SAID.kind },
		{ name: 'half a JPEG', bytes: jpeg.subarray(0, jpeg.length / 2), said: PHOTO_SAID.broken },
		{ name: 'HEIC of 17 megapixels', bytes: await readFile(heic), said: PHOTO_SAID.heic },
		{
			name: '30 MB',
			bytes: Buffer.concat([jpeg, Buffer.alloc(30_000_000 - jpeg.length)]),
			said: PHOTO_SAID.size
		},
		{
			name: 'JPEG that is a zip and a page too',
			bytes: Buffer.concat([jpeg, ZIP, Buffer.from(PAGE)]),
			said: null
		}
	];
}
