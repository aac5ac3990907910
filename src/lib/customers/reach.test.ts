import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { foundBy, phoneKey, sought } from './reach';

describe('people are found', () => {
	it.each([
		['(555) 014-2299', '5550142299'],
		['0555 014 2299', '5550142299'],
		['+1 555.014.2299', '15550142299'],
		['', '']
	])('by the digits of %s', (typed, key) => expect(phoneKey(typed)).toBe(key));

	it('by a piece of the name without its accents, or of the number without its dashes', () => {
		const key = foundBy({ name: 'Zoë  Brénnick', phone: '555-0142', email: 'zoe@mail.example' });
		expect(key).toBe('zoe brennick 5550142 zoe@mail.example');
		for (const typed of ['bren', 'ZOË', '55-01', '0142', 'brennick zoe', 'zoe@'])
			expect(
				sought(typed).every((piece) => key.includes(piece)),
				typed
			).toBe(true);
		expect(sought('ida').every((piece) => key.includes(piece))).toBe(false);
	});

	it('by any piece of their own number, however it is written', () => {
		const digit = fc.integer({ min: 1, max: 9 });
		const number = fc.array(digit, { minLength: 5, maxLength: 11 }).map((list) => list.join(''));
		fc.assert(
			fc.property(number, fc.nat(4), fc.constantFrom('-', ' ', '.', ''), (all, from, between) => {
				const key = foundBy({ name: 'Ida', phone: all, email: '' });
				const piece = all
					.slice(from, from + 4)
					.split('')
					.join(between);
				expect(sought(piece).every((one) => key.includes(one))).toBe(true);
			})
		);
	});

	it('whatever is typed', () => {
		fc.assert(
			fc.property(fc.string(), (typed) => {
				expect(sought(typed).length).toBeLessThan(7);
			})
		);
	});
});
