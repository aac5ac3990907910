import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { labels, marks, worthInWords, type Label } from './worth-line';

const say = (cents: number) => `$${(cents / 100).toFixed(cents % 100 ? 2 : 0)}`;
const starter = {
	scrapCents: 100,
	payFromCents: 2900,
	askedCents: 4600,
	copyCents: 5800,
	newCents: 13600
};

describe('marks', () => {
	it('run from scrap to new', () => {
		const at = Object.fromEntries(marks(starter).map((mark) => [mark.name, mark.at]));
		expect(at).toEqual({ scrap: 0, 'pays from': 20.74, asked: 33.33, copy: 42.22, new: 100 });
	});
	it('reach past new when something costs more', () => {
		const found = marks({ scrapCents: 0, newCents: 5000, payFromCents: 10000, askedCents: 2000 });
		expect(found.find(({ name }) => name === 'new')?.at).toBe(50);
	});
	it('are not drawn without any price, or without a span', () => {
		expect(marks({ scrapCents: 100, payFromCents: 500 })).toEqual([]);
		expect(marks({ scrapCents: 100, newCents: 100 })).toEqual([]);
		expect(marks({ newCents: null, askedCents: undefined })).toEqual([]);
	});
});

// Pixels a label takes on a line of the given length, by the widths of the faces.
function box(label: Label, length: number) {
	const width =
		(label.name.length + 1) * 7.7 + label.text.length * (label.name === 'asked' ? 10.6 : 8.7);
	const x = (label.x / 100) * length;
	const from = { start: x, middle: x - width / 2, end: x - width }[label.anchor];
	return { from, to: from + width };
}

describe('labels', () => {
	it('name every mark of a usual part', () => {
		expect(labels(marks(starter), say).map(({ name }) => name)).toEqual([
			'asked',
			'pays from',
			'new',
			'copy',
			'scrap'
		]);
	});
	it('never overlap nor leave the line, at any figures and any length from 280 px', () => {
		const cents = fc.option(fc.integer({ min: 0, max: 99_999_99 }));
		const figures = fc.record({
			scrapCents: cents,
			payFromCents: cents,
			askedCents: cents,
			copyCents: cents,
			newCents: cents
		});
		fc.assert(
			fc.property(figures, fc.integer({ min: 280, max: 900 }), (given, length) => {
				const placed = labels(marks(given), say);
				for (const one of placed) {
					const mine = box(one, length);
					expect(mine.from).toBeGreaterThanOrEqual(-0.01);
					expect(mine.to).toBeLessThanOrEqual(length + 0.01);
					for (const other of placed) {
						if (other === one || other.row !== one.row) continue;
						const its = box(other, length);
						expect(mine.to <= its.from + 0.01 || its.to <= mine.from + 0.01).toBe(true);
					}
				}
			})
		);
	});
	it('always keep the asked price', () => {
		const tight = marks({ scrapCents: 0, payFromCents: 99, askedCents: 100, newCents: 101 });
		expect(labels(tight, say)[0]).toMatchObject({ name: 'asked', row: 'over' });
	});
});

describe('in words', () => {
	it('says the marks and where asked stands', () => {
		expect(worthInWords(marks(starter), say)).toBe(
			'Worth: scrap $1, pays from $29, copy $58, new $136, asked $46. Asked is $17 above where it pays.'
		);
	});
	it('says when it does not pay', () => {
		const found = marks({ ...starter, askedCents: 1800 });
		expect(worthInWords(found, say)).toContain('Asked is $11 below where it pays.');
	});
	it('leaves the comparison out when there is none', () => {
		expect(worthInWords(marks({ newCents: 9800 }), say)).toBe('Worth: scrap $0, new $98.');
	});
});
