import { describe, expect, it } from 'vitest';
import { WorthError, yearlyToContinuous } from './index';

describe('yearly into continuous rates', () => {
	it('takes money as interest and dying as a hazard', () => {
		expect(yearlyToContinuous(0.1, 'money')).toBeCloseTo(Math.log(1.1), 12);
		expect(yearlyToContinuous(0.25, 'money')).toBeCloseTo(0.223144, 6);
		expect(yearlyToContinuous(0.15, 'dying')).toBeCloseTo(-Math.log(0.85), 12);
		expect(yearlyToContinuous(0, 'money')).toBe(0);
		expect(yearlyToContinuous(0, 'dying') + 0).toBe(0);
	});

	it('refuses what cannot be a yearly share', () => {
		for (const bad of [-0.1, NaN, Infinity]) {
			expect(() => yearlyToContinuous(bad, 'money')).toThrow(WorthError);
		}
		expect(() => yearlyToContinuous(1, 'dying')).toThrow(
			expect.objectContaining({ field: 'yearly' })
		);
	});
});
