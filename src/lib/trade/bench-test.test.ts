import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boundsSaid, isKindId, kind, kinds, outside, setOf, testFields } from './index';
import { BENCH_TESTS, IN_PLACE } from './bench-tests.data';

describe('the tests of the kinds', () => {
	it('are of kinds that may be kept, each field once, bounds in order', () => {
		for (const [id, { fields }] of Object.entries(BENCH_TESTS)) {
			expect(kind(id).reuse, id).not.toBe('never');
			expect(new Set(fields.map((field) => field.id)).size).toBe(fields.length);
			for (const { least = 0, most = Infinity } of fields) expect(least).toBeLessThanOrEqual(most);
		}
		expect(Object.keys(IN_PLACE).every(isKindId)).toBe(true);
	});
	it('read a figure wherever the trade says one of a thing that is tested', () => {
		const figured = /\b\d+(\.\d+)? ?(psi|V|ohm|kohm|Mohm|%|in|mm)\b/;
		for (const each of kinds.filter(({ reuse }) => reuse === 'test'))
			if (figured.test(each.howTested))
				expect(testFields(each.id).length, `${each.id}: ${each.howTested}`).toBeGreaterThan(0);
	});
});

describe('the bounds', () => {
	const field = { id: 'coil', said: 'Coil', unit: 'ohm', least: 2, most: 5 };
	it('are said in words', () => {
		expect(boundsSaid(field)).toBe('2 to 5 ohm');
		expect(boundsSaid({ ...field, least: 5 })).toBe('5 ohm');
		expect(boundsSaid({ id: 'x', said: 'X', unit: 'V', most: 0.2 })).toBe('0.2 V or less');
		expect(boundsSaid({ id: 'x', said: 'X', unit: 'psi', least: 1 })).toBe('1 psi or more');
		expect(boundsSaid({ id: 'x', said: 'X', unit: 'A' })).toBe('');
	});
	it('are the shop own where it set them, one by one', () => {
		const [mine] = testFields('eclutch', { coil: { most: 4 } });
		expect(mine).toMatchObject({ least: 2, most: 4 });
		expect(testFields('starter12', { current: { most: 60 } })[0]).toMatchObject({ most: 60 });
		expect(testFields('eclutch')[0]).toMatchObject({ least: 2, most: 5 });
	});
	it('a figure is outside exactly when it is under the least or over the most', () => {
		fc.assert(
			fc.property(fc.double({ min: -10, max: 20, noNaN: true }), (value) => {
				expect(outside([field], { coil: value }).length).toBe(value < 2 || value > 5 ? 1 : 0);
			})
		);
		expect(outside([field], {})).toEqual([]);
		expect(outside([field], { coil: 9 })).toEqual(['Coil: 9 ohm, usual is 2 to 5 ohm']);
	});
});

describe('the sets', () => {
	it('belong to kinds, piece by piece', () => {
		expect(setOf('starter12')).toContain('2 bolts');
		expect(setOf('plug')).toEqual([]);
		for (const { id } of kinds) expect(new Set(setOf(id)).size).toBe(setOf(id).length);
		expect(() => setOf('nothing')).toThrow(RangeError);
	});
});
