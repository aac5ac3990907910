import fc from 'fast-check';
import { expect, it } from 'vitest';
import { inside } from './shrink-size';

const side = fc.integer({ min: 1, max: 12_000 });

it('a picture fits the square, keeps its shape and is never made larger', () => {
	fc.assert(
		fc.property(side, side, (width, height) => {
			const small = inside(width, height, 2048);
			expect(Math.max(small.width, small.height)).toBeLessThanOrEqual(2048);
			expect(small.width).toBeLessThanOrEqual(width);
			expect(small.height).toBeLessThanOrEqual(height);
			if (Math.min(small.width, small.height) > 1)
				expect(Math.abs(small.width * height - small.height * width)).toBeLessThanOrEqual(
					Math.max(width, height)
				);
		})
	);
});
