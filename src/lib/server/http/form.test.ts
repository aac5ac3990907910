import { describe, expect, it } from 'vitest';
import { formObject, typedAgain } from './form';

const form = (fields: [string, string | File][]) => {
	const data = new FormData();
	for (const [name, value] of fields) data.append(name, value);
	return data;
};

describe('a form', () => {
	const sent = form([
		['maker', 'Pellwyn'],
		['model', '  '],
		['serial', ''],
		['fittings[]', ''],
		['fittings[]', 'recoil'],
		['tick', 'a'],
		['tick', 'b'],
		['photo', new File([], '')],
		['password', 'under the long shelf'],
		['idempotencyKey', 'k-1']
	]);
	it('is read without what was left empty', () => {
		const { idempotencyKey, password, ...fields } = formObject(sent);
		expect(fields).toEqual({ maker: 'Pellwyn', fittings: ['recoil'], tick: ['a', 'b'] });
		expect([idempotencyKey, password]).toEqual(['k-1', 'under the long shelf']);
	});
	it('is shown again as it was typed, emptied fields too, passwords and keys never', () => {
		expect(typedAgain(sent)).toEqual({
			maker: 'Pellwyn',
			serial: '',
			fittings: ['recoil'],
			tick: ['a', 'b']
		});
	});
});
