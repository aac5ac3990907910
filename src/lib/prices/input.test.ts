import { describe, expect, it } from 'vitest';
import { oddPrice } from './band';
import { ofForm, PriceForm, PriceInput } from './input';
import { isStale, staleBefore } from './stale';

const price = {
	kind: 'coil',
	engine: 'Ondrake TARN-21L',
	newCents: 4400,
	source: 'Counter book',
	seenOn: '2026-03-03'
};
const faults = (input: object) =>
	PriceInput.safeParse(input).error?.issues.map(({ path, message }) => [path.join('.'), message]);

describe('a price', () => {
	it('belongs to an engine or a number, and says so', () => {
		expect(PriceInput.safeParse(price).success).toBe(true);
		expect(PriceInput.safeParse({ ...price, engine: undefined, number: '12-345' }).success).toBe(
			true
		);
		const words = 'Enter the engine or the part number: a price belongs to one of them';
		expect(faults({ ...price, engine: undefined })).toEqual([['engine', words]]);
		expect(faults({ ...price, engine: ' -. ', number: '--' })).toEqual([['engine', words]]);
	});
	it.each([
		[{ kind: 'teapot' }, 'kind'],
		[{ newCents: 0 }, 'newCents'],
		[{ newCents: 12.5 }, 'newCents'],
		[{ copyCents: -1 }, 'copyCents'],
		[{ source: ' ' }, 'source'],
		[{ seenOn: '2026-02-30' }, 'seenOn'],
		[{ seenOn: 'yesterday' }, 'seenOn']
	])('with %j is refused at %s', (change, field) => {
		expect(faults({ ...price, ...change })?.[0]?.[0]).toBe(field);
	});
	it('is typed with decimals in a form', () => {
		const { newCents: _, ...fields } = price;
		const form = PriceForm.parse({ ...fields, new: '46.50', copy: '$18' });
		expect(ofForm(form, 'USD')).toEqual({ ...fields, newCents: 4650, copyCents: 1800 });
		expect(PriceForm.safeParse({ ...fields, new: 'dear' }).error?.issues[0]?.message).toBe(
			'Enter the price of a new one as an amount, like 46 or 46.50'
		);
	});
	it('outside what most of its kind cost is only warned of', () => {
		const say = (cents: number) => `$${cents / 100}`;
		expect(oddPrice({ kind: 'carb-float', newCents: 30000 }, say)).toBeNull();
		expect(oddPrice({ kind: 'carb-float', newCents: 90000 }, say)).toContain(
			'cost $15 to $300: this one is $900'
		);
		expect(oddPrice({ kind: 'carb-float', newCents: 1000 }, say)).toContain('$10');
	});
	it('is old after the limit, the same by day and by query', () => {
		const now = new Date('2026-09-10T12:00:00Z');
		expect(staleBefore(now, 180)).toBe('2026-03-14');
		expect([isStale('2026-03-14', now, 180), isStale('2026-03-13', now, 180)]).toEqual([
			false,
			true
		]);
	});
});
