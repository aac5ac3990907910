import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { carcassGrams } from './carcass';
import { FinishForm, WasteForm } from './input';

describe('what is left of an engine', () => {
	it('is what it weighs less what was taken off, to the hundred grams', () => {
		expect(carcassGrams(16_000, [2400, 130])).toBe(13_500);
	});

	it('never rises with a further part, and never goes under half a kilogram', () => {
		const grams = fc.integer({ min: 1, max: 60_000 });
		fc.assert(
			fc.property(grams, fc.array(grams), grams, (whole, off, more) => {
				const left = carcassGrams(whole, off);
				expect(left).toBeGreaterThanOrEqual(500);
				expect(carcassGrams(whole, [...off, more])).toBeLessThanOrEqual(left);
			})
		);
	});
});

describe('what is typed', () => {
	it.each([
		['21.5', 21_500],
		['21,5', 21_500],
		['9', 9000]
	])('%s kg', (kilos, grams) => {
		expect(FinishForm.parse({ kilos, scrapClass: 'Al-Fe' })).toMatchObject({ grams, drained: [] });
	});

	it.each(['', '0', '-4', 'heavy', '1e4'])('“%s” is no weight', (kilos) => {
		const { error } = FinishForm.safeParse({ kilos, scrapClass: 'Al-Fe' });
		expect(error?.issues[0]?.message).toMatch(/^Enter (the weight|a weight)/);
	});

	it('litres are kept as millilitres', () => {
		const typed = { what: 'used oil', way: 'in', litres: '0,6' };
		expect(WasteForm.parse(typed)).toMatchObject({ millilitres: 600 });
	});
});
