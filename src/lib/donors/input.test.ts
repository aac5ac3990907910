import { describe, expect, it } from 'vitest';
import { DonorEditForm, TakeInForm } from './form';
import { DonorEdit, ReleaseInput, TakeIn } from './input';
import { donorNumber, sayEngine } from './reference';

const says = (parsed: { success: boolean; error?: { issues: { message: string }[] } }) =>
	parsed.error?.issues[0]?.message;

describe('taking in', () => {
	it('keeps raw text as it was read, question marks too', () => {
		const { serial, model } = TakeIn.parse({ serial: ' 09?7-B ', model: 'TARN-21?' });
		expect([serial, model]).toEqual(['09?7-B', 'TARN-21?']);
	});

	it('takes figures as the form types them', () => {
		const read = TakeInForm.parse({ model: 'TARN-21L', displacementCc: '212,5', paid: '15.50' });
		expect(read).toMatchObject({ displacementCc: 212.5, paidCents: 1550 });
		expect(TakeInForm.parse({ model: 'TARN-21L' })).not.toHaveProperty('paidCents');
	});

	it.each([
		[{ displacementCc: 'many' }, 'Enter the displacement in cc, as a number like 210'],
		[{ paid: '-3' }, 'Enter what was paid as a number, like 15 or 15.50'],
		[{ shaft: 'sideways' }, 'Choose horizontal or vertical'],
		[{ class: 'XX' }, 'Choose the class of engine'],
		[{ cause: 'bored' }, 'Choose the cause of death']
	])('refuses %j in words', (typed, said) => {
		expect(says(TakeInForm.safeParse({ model: 'TARN-21L', ...typed }))).toBe(said);
	});
});

describe('editing', () => {
	it('by form empties what was left empty, but not the cause, which has its own form', () => {
		const read = DonorEditForm.parse({ model: 'LOFT-16U', version: '3' });
		expect(read).toMatchObject({ maker: '', serial: '', displacementCc: null, version: 3 });
		expect(read).not.toHaveProperty('cause');
	});

	it('at the outside edge leaves alone what was not said', () => {
		expect(DonorEdit.parse({ maker: 'Pellwyn' })).toEqual({ maker: 'Pellwyn' });
		expect(DonorEdit.parse({ shaft: null })).toEqual({ shaft: null });
	});
});

describe('a release', () => {
	it('needs its route, and days that are days', () => {
		expect(says(ReleaseInput.safeParse({}))).toMatch(/^Choose by which route/);
		expect(says(ReleaseInput.safeParse({ route: 'own', on: '12 March' }))).toMatch(
			/^Enter the day/
		);
		expect(ReleaseInput.parse({ route: 'own' })).toEqual({ route: 'own', document: '' });
	});
});

describe('how a donor is named', () => {
	it.each([
		['D12', 12],
		['d12', 12],
		['12', 12],
		['D0', null],
		['K7M3X', null],
		['D12x', null],
		['', null]
	])('%s', (typed, number) => expect(donorNumber(typed)).toBe(number));

	it('by maker and model, or as not read yet', () => {
		expect(sayEngine({ maker: 'Grauvik', model: 'BULK-54U' })).toBe('Grauvik BULK-54U');
		expect(sayEngine({ maker: '', model: '' })).toBe('Engine not read yet');
	});
});
