import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { asksOf, whatSaid } from './asks';

describe('a search in vain becomes a want', () => {
	it.each([
		['recoil starter tarn-21', { kind: 'recoil', engine: 'tarn-21', measures: '', numbers: [] }],
		['pull cord thing for pellwyn', { kind: 'recoil' }],
		['muffler 40 mm', { kind: 'muffler', engine: '', measures: '40 mm' }],
		['TN-4471-02', { kind: '', engine: '', numbers: ['TN-4471-02'] }]
	])('%s', (typed, asks) => expect(asksOf(typed)).toMatchObject(asks));

	it('keeps the kind it was narrowed to', () => {
		expect(asksOf('grauvik', 'coil')).toMatchObject({ kind: 'coil', engine: 'grauvik' });
	});

	it('never throws, whatever was typed', () => {
		fc.assert(
			fc.property(fc.string(), (typed) => {
				expect(whatSaid(asksOf(typed, 'coil'))).toContain('coil');
			})
		);
	});

	it('is said as the counter says it', () => {
		expect(
			whatSaid({ kind: 'recoil', engine: 'Ondrake TARN-21L', measures: '40 mm', numbers: ['TN 1'] })
		).toBe('Recoil starter assembly for Ondrake TARN-21L, 40 mm, TN 1');
		expect(whatSaid({ kind: '', engine: '', measures: '', numbers: ['TN 1'] })).toBe('Part TN 1');
	});
});
