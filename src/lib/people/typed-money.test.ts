import { describe, expect, it } from 'vitest';
import { centsTyped, inCents, typedAmount } from './typed-money';

describe('money as people type it', () => {
	it.each([
		['46', 46],
		['46.50', 46.5],
		['46,50', 46.5],
		[' $1,200.00 ', 1200],
		['1,200', 1200],
		['€ 12', 12],
		['0.5', 0.5],
		['', null],
		['abc', null],
		['-5', null],
		['1.2345', null],
		['1e3', null],
		['12.5.5', null]
	])('%j is %j', (typed, amount) => {
		expect(typedAmount(typed)).toBe(amount);
	});
	it('becomes the smallest unit of the currency and back', () => {
		expect([inCents(46.5, 'USD'), inCents(46, 'JPY'), inCents(1.005, 'KWD')]).toEqual([
			4650, 46, 1005
		]);
		expect([
			centsTyped(4650, 'USD'),
			centsTyped(4600, 'USD'),
			centsTyped(46, 'JPY'),
			centsTyped(null, 'USD')
		]).toEqual(['46.50', '46', '46', '']);
	});
});
