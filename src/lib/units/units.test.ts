import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	bothWays,
	ccToCubicInch,
	cubicInchToCc,
	inchToMm,
	inInches,
	inMm,
	mmToInch,
	parseDisplacement,
	parseLength
} from './index';

// NIST SP 811, Appendix B: 1 in = 25.4 mm and 1 cu in = 16.387064 cc, both exact
describe('conversions', () => {
	it('are the exact ones', () => {
		expect(inchToMm(1)).toBe(25.4);
		expect(inchToMm(0.001)).toBeCloseTo(0.0254, 12);
		expect(cubicInchToCc(1)).toBe(16.387064);
	});

	it.each([
		[5 / 8, 15.875],
		[3 / 4, 19.05],
		[7 / 8, 22.225],
		[1, 25.4],
		[1.125, 28.575]
	])('of shaft sizes: %d in is %d mm', (inches, mm) => {
		expect(inchToMm(inches)).toBeCloseTo(mm, 10);
	});

	it('go there and back', () => {
		fc.assert(
			fc.property(fc.double({ min: 0, max: 1e4, noNaN: true }), (size) => {
				expect(mmToInch(inchToMm(size))).toBeCloseTo(size, 8);
				expect(ccToCubicInch(cubicInchToCc(size))).toBeCloseTo(size, 8);
			})
		);
	});
});

describe('a typed length', () => {
	it.each([
		['3/4', 19.05, 'inch'],
		['1-1/8', 28.575, 'inch'],
		['2 7/16 in', 61.9125, 'inch'],
		['2-7/16"', 61.9125, 'inch'],
		['0.75"', 19.05, 'inch'],
		['.75 inch', 19.05, 'inch'],
		['1½ in.', 38.1, 'inch'],
		['⅞', 22.225, 'inch'],
		['25 mm', 25, 'mm'],
		['25MM', 25, 'mm'],
		['25,4mm', 25.4, 'mm'],
		['2.5 cm', 25, 'mm'],
		['1', 25.4, 'inch']
	])('%s in a shop that shows inches first', (typed, mm, unit) => {
		const read = parseLength(typed, 'inch');
		expect(read).toMatchObject({ unit, typed });
		expect('mm' in read && read.mm).toBeCloseTo(mm, 9);
	});

	it('takes a number alone in the unit shown first, a fraction always in inches', () => {
		expect(parseLength('42', 'mm')).toEqual({ mm: 42, unit: 'mm', typed: '42' });
		expect(parseLength('25,4', 'mm')).toMatchObject({ mm: 25.4 });
		expect(parseLength('3/4', 'mm')).toMatchObject({ unit: 'inch' });
	});

	it('keeps 25 mm and 1 inch apart', () => {
		expect(parseLength('25 mm', 'inch')).not.toMatchObject({ mm: 25.4 });
	});

	it('says when there is nothing to read', () => {
		expect(parseLength('  ', 'mm')).toEqual({ problem: 'empty' });
		for (const typed of [
			'about one',
			'1/0',
			'-3 mm',
			'3 ft',
			'1..2',
			'3/4/5',
			'Infinity',
			'1e5 in'
		]) {
			expect(parseLength(typed, 'mm')).toEqual({ problem: 'unreadable' });
		}
	});
});

describe('a length in words', () => {
	it.each([
		[19.05, '3/4 in', '19.05 mm'],
		[28.575, '1-1/8 in', '28.58 mm'],
		[61.9125, '2-7/16 in', '61.91 mm'],
		[25.4, '1 in', '25.4 mm'],
		[25, '63/64 in', '25 mm'],
		[22.2, '0.874 in', '22.2 mm'],
		[0.01, '0 in', '0.01 mm'],
		[0, '0 in', '0 mm']
	])('%d mm', (mm, inches, millimetres) => {
		expect(inInches(mm)).toBe(inches);
		expect(inMm(mm)).toBe(millimetres);
	});

	it('is said both ways', () => {
		expect(bothWays(19.05, 'inch')).toBe('3/4 in (19.05 mm)');
		expect(bothWays(19.05, 'mm')).toBe('19.05 mm (3/4 in)');
	});

	it('reads back as it was said, within a calliper', () => {
		fc.assert(
			fc.property(fc.double({ min: 1, max: 500, noNaN: true }), (mm) => {
				const read = parseLength(inInches(mm), 'mm');
				expect('mm' in read && Math.abs(read.mm - mm)).toBeLessThanOrEqual(0.0201);
			})
		);
	});
});

describe('a typed displacement', () => {
	it.each([
		['210cc', 210],
		['210', 210],
		['12.9 cu in', 211.3931256],
		['12,9 cu. in.', 211.3931256],
		['30 in³', 491.61192],
		['0.42 l', 420],
		['195 cm3', 195]
	])('%s', (typed, cc) => {
		const read = parseDisplacement(typed);
		expect('cc' in read && read.cc).toBeCloseTo(cc, 6);
	});

	it('says when there is nothing to read', () => {
		expect(parseDisplacement('')).toEqual({ problem: 'empty' });
		for (const typed of ['big', '-5', '0', '5 hp', '2 x 100']) {
			expect(parseDisplacement(typed)).toEqual({ problem: 'unreadable' });
		}
	});
});
