import sharp from 'sharp';
import { afterAll, describe, expect, it } from 'vitest';
import { emissionScene } from '../../../../fixtures/pictures/emission-label';
import { toJpeg } from '../../../../fixtures/pictures/jpeg';
import { plateScene } from '../../../../fixtures/pictures/scenes';
import { readLabel } from '../../donors/label';
import type { PlateField } from '../../donors/plate-fields';
import { readText } from './read-text';
import { stopReader } from './text-reader';

const MAKERS = ['Pellwyn', 'Ondrake'];
const PLATE: [string, string][] = [
	['model', 'TARN-21L'],
	['type', '0417-E2'],
	['code', '19053104'],
	['serial', 'KD7719024']
];
const EMISSION = {
	maker: 'Ondrake',
	family: 'HNDKS.2101AB',
	displacement: '210 cc',
	model: 'TARN-33E',
	code: '16110704',
	serial: '7719024'
};

const plate = () => toJpeg(plateScene('Ondrake', PLATE, 'a plate'));
const emission = () => toJpeg(emissionScene(EMISSION));

/** O for 0 and I for 1 are one to whoever looks for them. */
const folded = (text: string) => text.replaceAll('O', '0').replaceAll('I', '1');

async function read(picture: Buffer) {
	const seen = await readText(picture);
	const { offers, lines } = readLabel(seen, MAKERS);
	const found = Object.fromEntries(offers.map(({ field, value }) => [field, folded(value)]));
	return { seen, offers, lines, found: found as Partial<Record<PlateField, string>> };
}

afterAll(stopReader);

describe('the text on a photo', () => {
	it('of a stamped plate, where it says', async () => {
		const { found, lines, offers, seen } = await read(await plate());
		expect(found).toMatchObject({
			maker: '0ndrake',
			model: 'TARN-21L',
			typeCode: '0417-E2',
			dateCode: '19053104',
			serial: 'KD7719024'
		});
		expect(lines.length).toBeGreaterThan(3);
		expect(seen.turn).toBe(0);
		const model = offers.find(({ field }) => field === 'model')!.spot;
		// the value of the first row begins at 420 of 1200, 356 of 900
		expect(model.x).toBeLessThan(0.36);
		expect(model.x + model.wide).toBeGreaterThan(0.55);
		expect(model.y).toBeGreaterThan(0.36);
		expect(model.y + model.high).toBeLessThan(0.47);
	});

	it('of an emission label', async () => {
		const { found } = await read(await emission());
		expect(found).toMatchObject({
			maker: '0ndrake',
			model: 'TARN-33E',
			dateCode: '16110704',
			serial: '7719024',
			displacementCc: '210',
			emissionFamily: 'HNDKS.2101AB'
		});
	});

	it.each([90, 180, 270])('is found on its side, turned by %i', async (turned) => {
		const { found, seen } = await read(
			await sharp(await plate())
				.rotate(turned)
				.toBuffer()
		);
		expect(seen.turn).toBe(360 - turned);
		expect(found).toMatchObject({ maker: '0ndrake', model: 'TARN-21L', serial: 'KD7719024' });
	});

	it('is straightened where it leans', async () => {
		const leaning = sharp(await emission()).rotate(6, { background: '#3d434a' });
		const { found, seen } = await read(await leaning.toBuffer());
		expect(seen.turn).toBeGreaterThan(-7.5);
		expect(seen.turn).toBeLessThan(-4.5);
		expect(found).toMatchObject({ dateCode: '16110704', displacementCc: '210' });
	});

	it('is read in bad light and a little out of focus', async () => {
		const dim = await read(
			await sharp(await plate())
				.modulate({ brightness: 0.3 })
				.toBuffer()
		);
		expect(dim.found).toMatchObject({ model: 'TARN-21L', dateCode: '19053104' });
		const blurred = await read(
			await sharp(await emission())
				.blur(2)
				.toBuffer()
		);
		expect(blurred.found).toMatchObject({ dateCode: '16110704', displacementCc: '210' });
	});

	it('is none on a bare surface, and nothing is offered', async () => {
		const bare = sharp({ create: { width: 800, height: 600, channels: 3, background: '#888' } });
		const { offers } = await read(await bare.jpeg().toBuffer());
		expect(offers).toEqual([]);
	});

	it('is read one photo after the other, and a broken one stops no other', async () => {
		const picture = await plate();
		const [broken, whole] = await Promise.allSettled([
			readText(Buffer.from('no picture')),
			read(picture)
		]);
		expect(broken.status).toBe('rejected');
		expect(whole).toMatchObject({ value: { found: { model: 'TARN-21L' } } });
	});
});
