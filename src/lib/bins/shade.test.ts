import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { levelOf, thirds } from './shade';

describe('shading', () => {
	it('is none for nothing, and by steps else', () => {
		const steps = { middle: 0.5, strong: 0.95 };
		expect([0, 0.1, 0.5, 0.94, 0.95, 2].map((one) => levelOf(one, steps))).toEqual([
			0, 1, 2, 2, 3, 3
		]);
	});

	it('of money goes by thirds of the bins of the shop; empty ones do not count', () => {
		expect(thirds([0, 10, 20, 30, 0])).toEqual({ middle: 20, strong: 30 });
		expect(thirds([])).toEqual({ middle: 0, strong: 0 });
	});

	it('never makes more money lighter', () => {
		fc.assert(
			fc.property(fc.array(fc.nat(1000)), fc.nat(1000), fc.nat(1000), (all, a, b) => {
				const steps = thirds(all);
				expect(levelOf(Math.max(a, b), steps)).toBeGreaterThanOrEqual(
					levelOf(Math.min(a, b), steps)
				);
			})
		);
	});
});
