import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { followers, freeNumber } from './pins';

describe('the number of a new pin', () => {
	it('is the lowest free one', () => {
		expect(freeNumber([])).toBe(1);
		expect(freeNumber([1, 2, 4])).toBe(3);
		fc.assert(
			fc.property(fc.array(fc.integer({ min: 1, max: 30 })), (taken) => {
				const n = freeNumber(taken);
				expect(taken).not.toContain(n);
				for (let lower = 1; lower < n; lower += 1) expect(taken).toContain(lower);
			})
		);
	});
});

describe('the pins that follow a part', () => {
	const pin = (id: number, photoId: number, n: number, partId: number | null = null) => ({
		...{ id, photoId, n, partId }
	});

	it('are one on each photo, the lowest number that waits', () => {
		const pins = [pin(1, 7, 4), pin(2, 7, 2), pin(3, 8, 9), pin(4, 9, 1, 55)];
		expect(followers(pins)).toEqual([2, 3]);
	});

	it('leave those alone that have a part', () => {
		expect(followers([pin(1, 7, 1, 55), pin(2, 7, 2)])).toEqual([2]);
		expect(followers([pin(1, 7, 1, 55)])).toEqual([]);
	});
});
