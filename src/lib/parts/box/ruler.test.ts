import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lexemesOf } from '../../donors/lexemes';
import { apart, MOST_ZOOM, toPicture, toStage, type Point } from './geometry';
import {
	LEAST_APART,
	measureLine,
	readLength,
	rulerLength,
	sayReading,
	usualSizes,
	type Ruler
} from './ruler';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const point: fc.Arbitrary<Point> = fc.record({ x: share, y: share });
const tall = fc.double({ min: 0.3, max: 3, noNaN: true });
const mm = fc.double({ min: 1, max: 1000, noNaN: true });
const set = fc
	.record({ from: point, to: point, mm, a: point, b: point, tall })
	.filter(({ from, to, tall }) => apart(from, to, tall) > 2 * LEAST_APART);

describe('a length on a picture', () => {
	it('does not depend on how far in one looks', () => {
		const zoom = fc.double({ min: 1, max: MOST_ZOOM, noNaN: true });
		fc.assert(
			fc.property(set, zoom, point, ({ from, to, mm, a, b, tall }, zoom, at) => {
				const view = { zoom, x: at.x * (1 - zoom), y: at.y * (1 - zoom) };
				const tapped = (p: Point) => toPicture(view, toStage(view, p));
				const plain = readLength({ from, to, mm }, a, b, tall)!;
				const ruler = { from: tapped(from), to: tapped(to), mm };
				const near = readLength(ruler, tapped(a), tapped(b), tall)!;
				expect(near.mm).toBeCloseTo(plain.mm, 6);
				expect(near.offMm).toBeCloseTo(plain.offMm, 6);
			})
		);
	});

	it('of the ruler itself is what was typed, whichever way round', () => {
		fc.assert(
			fc.property(set, ({ from, to, mm, tall }) => {
				expect(readLength({ from, to, mm }, to, from, tall)!.mm).toBeCloseTo(mm, 9);
			})
		);
	});

	it('grows with the ruler and with the distance', () => {
		fc.assert(
			fc.property(set, ({ from, to, mm, a, b, tall }) => {
				const once = readLength({ from, to, mm }, a, b, tall)!;
				expect(readLength({ from, to, mm: 2 * mm }, a, b, tall)!.mm).toBeCloseTo(2 * once.mm, 6);
				const mid = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
				expect(readLength({ from, to, mm }, a, mid, tall)!.mm).toBeCloseTo(once.mm / 2, 6);
			})
		);
	});

	it('is surer with a longer ruler', () => {
		const ruler = (x: number): Ruler => ({ from: { x: 0, y: 0 }, to: { x, y: 0 }, mm: x * 200 });
		const read = (x: number) => readLength(ruler(x), { x: 0, y: 0 }, { x: 0.25, y: 0 }, 1)!;
		expect(read(0.1).mm).toBeCloseTo(50, 9);
		expect(read(0.8).mm).toBeCloseTo(50, 9);
		expect(read(0.8).offMm).toBeLessThan(read(0.1).offMm);
	});

	it('takes into account that pictures are not square', () => {
		const ruler = { from: { x: 0, y: 0 }, to: { x: 0.5, y: 0 }, mm: 100 };
		expect(readLength(ruler, { x: 0, y: 0 }, { x: 0, y: 1 }, 0.75)!.mm).toBeCloseTo(150, 9);
	});

	it('needs a ruler with two ends', () => {
		const at = { x: 0.3, y: 0.3 };
		expect(readLength({ from: at, to: at, mm: 25 }, at, { x: 1, y: 1 }, 1)).toBeNull();
	});
});

describe('the length of a ruler as it is typed', () => {
	it.each([
		['3/4"', 'mm', 19.05],
		['25 mm', 'inch', 25],
		['2 7/16', 'mm', 61.9125],
		['6', 'inch', 152.4],
		['150', 'mm', 150]
	] as const)('%s where %s comes first', (typed, first, mm) => {
		const read = rulerLength(typed, first);
		expect('mm' in read && read.mm).toBeCloseTo(mm, 9);
	});

	it.each(['', 'a hand', '0', '9000 mm'])('%j says what to type', (typed) => {
		expect(rulerLength(typed, 'inch')).toHaveProperty('problem', expect.stringMatching(/^Enter/));
	});
});

describe('what a reading may be', () => {
	it('is said with its tolerance, the unit of the shop first', () => {
		const reading = { mm: 61.72, offMm: 0.84 };
		expect(sayReading(reading, 'mm')).toBe('61.7 mm ±0.8 (2.43 in ±0.03)');
		expect(sayReading(reading, 'inch')).toBe('2.43 in ±0.03 (61.7 mm ±0.8)');
	});

	it('is one of the usual sizes within the tolerance, the nearest first', () => {
		const sizes = usualSizes({ mm: 61.8, offMm: 0.8 }, 'inch').map(({ said }) => said);
		expect(sizes[0]).toBe('2-7/16 in');
		expect(sizes).toContain('62 mm');
		expect(usualSizes({ mm: 61.4, offMm: 0.1 }, 'mm')).toEqual([]);
	});

	it('never lies outside the tolerance', () => {
		const off = fc.double({ min: 0.1, max: 20, noNaN: true });
		fc.assert(
			fc.property(mm, off, (mm, offMm) => {
				for (const size of usualSizes({ mm, offMm }, 'inch'))
					expect(Math.abs(size.mm - mm)).toBeLessThanOrEqual(offMm);
			})
		);
	});

	it('is written so that a search for the size finds it', () => {
		const line = measureLine('bolt to bolt', { mm: 61.72, offMm: 0.84 }, 61.9125);
		expect(line).toBe('bolt to bolt 2-7/16 in, 61.91 mm: 61.7 mm ±0.8 off a photo');
		expect(lexemesOf(line).split(' ')).toEqual(
			expect.arrayContaining([lexemesOf('2 7/16'), lexemesOf('61.7 mm'), 'bolt'])
		);
		const plain = measureLine('bore', { mm: 42.04, offMm: 0.3 }, null);
		expect(lexemesOf(plain).split(' ')).toContain('42mm');
	});
});
