import type { Label } from '$lib/labels/label';
import { layOut } from '$lib/labels/layout';
import { STOCKS, type Stock } from '$lib/labels/stocks';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { decode, pageSizes, rasterOf } from '../../../../tests/support/decode';
import { measureIn, openPdf } from './faces';
import { labelsPdf } from './print';

const ADDRESS = 'HTTPS://ENDPLAY.EXAMPLE/T/OSIERGATE/K7M3X';
const label: Label = {
	...{ what: 'part', code: 'K7M3X', name: 'Carburetor, float bowl', engine: 'Ondrake TARN-21L' },
	...{ number: 'TN-3380', donor: 'D12', grade: 'untested', bin: 'K3-1', foot: 'Osiergate' },
	caution: 'Test before fitting'
};
const PIXELS = 203 / 25.4;

/** The code of the first label on the page, its quiet zone included, as the printer draws it. */
async function codeOn(stock: Stock, page: Buffer) {
	const { measures } = stock;
	const measure = measureIn(openPdf(''));
	const piece = layOut(label, ADDRESS, measures, measure).find((one) => one.what === 'qr')!;
	const at = (mm: number) => Math.round(mm * PIXELS);
	const side = Math.floor(piece.width * PIXELS);
	const left = Math.min(at(measures.left + piece.x), at(measures.pageWidth) - side);
	const top = at(measures.top + piece.y);
	return sharp(page).extract({ left, top, width: side, height: side }).png().toBuffer();
}

/** Where dirt lies or print is rubbed off, as shares of the way across and down. */
const SPOTS = { corner: [1, 1], middle: [0.5, 0.5], side: [1, 0.5], foot: [0.5, 1] } as const;
type Spot = keyof typeof SPOTS;

/** Dark dirt or a light rub over so much of the code, its quiet zone left out. */
async function smeared(code: Buffer, share: number, spot: Spot, color: string) {
	const { width: whole } = await sharp(code).metadata();
	const inner = whole * (29 / 37);
	const side = Math.round(inner * Math.sqrt(share));
	const at = (way: number) => Math.round((whole - inner) / 2 + way * (inner - side));
	const create = { width: side, height: side, channels: 3 as const, background: color };
	const [x, y] = SPOTS[spot];
	return sharp(code)
		.composite([{ input: { create }, left: at(x), top: at(y) }])
		.png()
		.toBuffer();
}

const turned = (code: Buffer, degrees: number) =>
	sharp(code).rotate(degrees, { background: '#fff' }).png().toBuffer();

/** As a camera sees it from afar: so many pixels to a module. */
async function small(code: Buffer, pixels: number) {
	return sharp(code)
		.resize(Math.round(37 * pixels))
		.extend({ top: 20, bottom: 20, left: 20, right: 20, background: '#fff' })
		.png()
		.toBuffer();
}

describe.each(STOCKS)('a label on $said', (stock) => {
	let pdf: Buffer;
	let code: Buffer;
	beforeAll(async () => {
		pdf = await labelsPdf([label, label], { stock, first: 1, addressOf: () => ADDRESS });
		code = await codeOn(stock, (await rasterOf(pdf))[0]!);
	});

	it('has pages of the true size', async () => {
		const { pageWidth, pageHeight } = stock.measures;
		const sizes = await pageSizes(pdf);
		expect(sizes).toHaveLength(stock.sheet ? 1 : 2);
		for (const [width, height] of sizes) {
			expect(width).toBeCloseTo(pageWidth, 0);
			expect(height).toBeCloseTo(pageHeight, 0);
		}
	});

	it('is read by an independent decoder, as printed at 203 dots an inch', async () => {
		const pages = await rasterOf(pdf);
		const read = (await Promise.all(pages.map(decode))).flat();
		expect(read).toEqual([ADDRESS, ADDRESS]);
	});

	it.each<[string, Spot, string]>([
		['grease', 'foot', '#888'],
		...Object.keys(SPOTS).map((spot): [string, Spot, string] => ['a rub', spot as Spot, '#eee'])
	])('is read with 15 %% of it under %s at the %s', async (_, spot, color) => {
		expect(await decode(await smeared(code, 0.15, spot, color))).toEqual([ADDRESS]);
	});

	it.each([17, 45, 90, 200])('is read turned by %i degrees', async (degrees) => {
		expect(await decode(await turned(code, degrees))).toEqual([ADDRESS]);
	});

	it('is read from afar, with two and a half pixels to a module', async () => {
		expect(await decode(await small(code, 2.5))).toEqual([ADDRESS]);
	});

	it('is read smeared, turned and small at once', async () => {
		const worse = await small(await smeared(code, 0.15, 'foot', '#888'), 4);
		expect(await decode(await turned(worse, 30))).toEqual([ADDRESS]);
	});
});

it('a code of which half is gone is not read: the decoder does decode', async () => {
	const stock = STOCKS[0]!;
	const pdf = await labelsPdf([label], { stock, first: 1, addressOf: () => ADDRESS });
	const code = await codeOn(stock, (await rasterOf(pdf))[0]!);
	expect(await decode(await smeared(code, 0.5, 'middle', '#111'))).toEqual([]);
});
