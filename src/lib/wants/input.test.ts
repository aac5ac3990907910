import { describe, expect, it } from 'vitest';
import { ofForm, WantForm, WantInput } from './input';

const said = (typed: unknown) =>
	(WantForm.safeParse(typed).error?.issues ?? []).map(({ path, message }) => [path[0], message]);

describe('the form of a want', () => {
	it('asks for who waits and for what, in the words of its labels', () => {
		expect(said({})).toEqual([
			['who', 'Choose who waits'],
			['kind', 'Choose the kind of part, or enter its number']
		]);
		expect(said({ who: 'known', kind: 'coil' })).toEqual([
			['customer', 'Choose who waits from the list']
		]);
		expect(said({ who: 'new', kind: 'coil' })).toEqual([['name', 'Enter the name of who waits']]);
		expect(said({ who: 'job', numbers: 'TN 1' })).toEqual([['job', 'Say which job it is for']]);
		expect(said({ who: 'job', job: 'x', numbers: '--' })).toHaveLength(1);
		expect(said({ who: 'job', job: 'x', kind: 'coil', most: 'a lot' })[0]).toEqual([
			'most',
			'Enter the most they pay as an amount, like 46 or 46.50'
		]);
	});

	it('does not mind what was typed for somebody else who waits', () => {
		const typed = {
			who: 'job',
			job: 'red tiller',
			email: 'no address',
			customer: 'x',
			kind: 'coil'
		};
		expect(said(typed)).toEqual([]);
		expect(ofForm(WantForm.parse(typed), 'USD')).toEqual({ kind: 'coil', job: 'red tiller' });
	});

	it('becomes what the verb takes: somebody new, with amounts in cents', () => {
		const typed = {
			who: 'new',
			name: ' Ida ',
			email: 'IDA@mail.example',
			kind: 'coil',
			most: '46.50'
		};
		expect(ofForm(WantForm.parse(typed), 'USD')).toEqual({
			...{ kind: 'coil', mostCents: 4650 },
			customer: { name: 'Ida', kind: 'customer', phone: '', email: 'ida@mail.example', note: '' }
		});
	});
});

describe('a want from a script', () => {
	it.each([
		[{ kind: 'coil' }, 'customer'],
		[{ kind: 'coil', customer: 1, job: 'x' }, 'customer'],
		[{ customer: 1 }, 'kind'],
		[{ customer: { name: '' }, kind: 'coil' }, 'customer'],
		[{ customer: 1, kind: 'no such' }, 'kind'],
		[{ customer: 1, kind: 'coil', mostCents: 0 }, 'mostCents']
	])('%j is refused at %s', (sent, field) => {
		expect(WantInput.safeParse(sent).error?.issues[0]?.path[0]).toBe(field);
	});

	it('names a customer by id or whole', () => {
		expect(WantInput.safeParse({ customer: 1, kind: 'coil' }).success).toBe(true);
		expect(WantInput.safeParse({ customer: { name: 'Ida' }, numbers: ['TN 1'] }).success).toBe(
			true
		);
	});
});
