import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MeasuresInput } from './measures';
import { perPage, placesFor, STOCKS, stockOf, type Measures } from './stocks';

const sheet = stockOf('a4').measures;
const faults = (change: Partial<Measures>) =>
	MeasuresInput.safeParse({ ...sheet, ...change }).error?.issues.map(({ path, message }) => [
		path[0],
		message
	]);

describe('stocks', () => {
	it.each(STOCKS)('$said is what may be entered by hand too', ({ measures }) => {
		expect(MeasuresInput.parse(measures)).toEqual(measures);
	});

	it('labels go on where the last sheet was left, none twice, none off the page', () => {
		const counts = fc.integer({ min: 1, max: 60 });
		fc.assert(
			fc.property(fc.constantFrom(...STOCKS), counts, counts, ({ measures: m }, count, start) => {
				const first = ((start - 1) % perPage(m)) + 1;
				const places = placesFor(count, first, m);
				expect(places).toHaveLength(count);
				expect(new Set(places.map(({ page, x, y }) => `${page} ${x} ${y}`)).size).toBe(count);
				for (const { x, y } of places) {
					expect(x + m.width).toBeLessThanOrEqual(m.pageWidth + 0.1);
					expect(y + m.height).toBeLessThanOrEqual(m.pageHeight + 0.1);
				}
				expect(places.at(-1)!.page).toBe(Math.floor((first - 1 + count - 1) / perPage(m)));
			})
		);
	});
});

describe('measures that a shop enters', () => {
	it('are read with a comma or a point', () => {
		const typed = { ...sheet, width: '99,1', left: '4.65', across: '2' };
		expect(MeasuresInput.parse(typed)).toEqual(sheet);
	});

	it('are refused in words when labels would lie over each other or run off the page', () => {
		expect(faults({ across: 3 })).toEqual([
			[
				'across',
				'So many labels across do not go on the page: look at their width, the margin and the pitch'
			]
		]);
		expect(faults({ pitchY: 30 })).toEqual([
			['pitchY', 'Labels lie over each other: enter a pitch down of at least their height']
		]);
		expect(faults({ width: 20 })).toEqual([
			['width', 'Enter the width of a label in mm, from 38 to 300']
		]);
	});
});
