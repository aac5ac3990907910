import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { usedPrice, WorthError, type UsedPriceInput } from './index';

// common practice, no source: $1 under $50, else $5; least price $10; cap 0.80 of a copy
const practice: UsedPriceInput = {
	newCents: 9600,
	share: 0.45,
	copyCap: 0.8,
	stepCents: [{ underCents: 5000, stepCents: 100 }, { stepCents: 500 }],
	leastCents: 1000
};

describe('used price', () => {
	it('is the share of new, rounded to the step', () => {
		expect(usedPrice(practice)).toEqual({ usedCents: 4300, cappedBy: null, belowLeast: false });
		expect(usedPrice({ ...practice, newCents: 8800, share: 0.6 }).usedCents).toBe(5500);
	});

	it('chooses the step from the price before rounding', () => {
		expect(usedPrice({ ...practice, newCents: 10000, share: 0.4999 }).usedCents).toBe(5000);
		expect(usedPrice({ ...practice, newCents: 10440, share: 0.5 }).usedCents).toBe(5000);
		expect(usedPrice({ ...practice, newCents: 9980, share: 0.5 }).usedCents).toBe(5000);
		expect(usedPrice({ ...practice, newCents: 10500, share: 0.5 }).usedCents).toBe(5500);
	});

	it('asks at most the cap of a copy, rounded down', () => {
		expect(usedPrice({ ...practice, newCents: 5800, copyCents: 1900, share: 0.6 })).toEqual({
			usedCents: 1500,
			cappedBy: 'copy',
			belowLeast: false
		});
		expect(usedPrice({ ...practice, copyCents: 90000 }).cappedBy).toBeNull();
		expect(usedPrice({ ...practice, copyCents: null }).cappedBy).toBeNull();
	});

	it('does not lose a step to binary noise', () => {
		const exact = { ...practice, newCents: 100000, share: 1, copyCents: 10000, copyCap: 0.57 };
		expect(usedPrice({ ...exact, stepCents: 100 }).usedCents).toBe(5700);
		expect(usedPrice({ ...practice, newCents: 1000, share: 0.35, stepCents: 100 }).usedCents).toBe(
			400
		);
	});

	it('says when it lies under the least price', () => {
		expect(usedPrice({ ...practice, newCents: 2000 })).toMatchObject({
			usedCents: 900,
			belowLeast: true
		});
		expect(usedPrice({ ...practice, newCents: 2222 }).belowLeast).toBe(false);
	});

	it.each([
		['newCents', -1],
		['newCents', NaN],
		['newCents', undefined],
		['copyCents', Infinity],
		['share', 1.01],
		['copyCap', -0.1],
		['leastCents', '10'],
		['stepCents', 0],
		['stepCents', []],
		['stepCents', [{ stepCents: -5 }]]
	])('refuses %s %s by name', (field, value) => {
		const bad = { ...practice, [field]: value } as UsedPriceInput;
		expect(() => usedPrice(bad)).toThrow(WorthError);
		expect(() => usedPrice(bad)).toThrow(expect.objectContaining({ field }));
	});

	it('never asks more than the cap, and never less for a dearer new part', () => {
		const cents = fc.integer({ min: 0, max: 200_000 });
		fc.assert(
			fc.property(
				cents,
				cents,
				cents,
				fc.double({ min: 0, max: 1, noNaN: true }),
				(a, b, copy, s) => {
					const at = (newCents: number) =>
						usedPrice({ ...practice, newCents, copyCents: copy, share: s });
					expect(at(Math.max(a, b)).usedCents).toBeGreaterThanOrEqual(at(Math.min(a, b)).usedCents);
					const priced = at(a);
					if (priced.cappedBy) expect(priced.usedCents).toBeLessThanOrEqual(0.8 * copy + 1e-6);
				}
			)
		);
	});
});
