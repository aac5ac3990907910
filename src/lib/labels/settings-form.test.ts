import { expect, it } from 'vitest';
import { readChoice } from './choice';
import { StockForm } from './settings-form';
import { stockOf } from './stocks';

it('a roll is said by its width and height', () => {
	const read = StockForm.parse({ stock: 'roll-62x29', version: '3', width: '50', height: '30,5' });
	expect(read).toMatchObject({ stock: 'roll-62x29', version: 3 });
	expect(read.measures).toMatchObject({ pageWidth: 50, pageHeight: 30.5, across: 1, pitchY: 30.5 });
});

it('a sheet keeps its paper; what is left empty is asked for by its label', () => {
	const { pageWidth, pageHeight, ...typed } = stockOf('letter').measures;
	const form = { stock: 'letter', version: '0', ...typed };
	expect(StockForm.parse(form).measures).toEqual({ pageWidth, pageHeight, ...typed });
	const { error } = StockForm.safeParse({ ...form, left: undefined });
	expect(error?.issues).toMatchObject([
		{ path: ['left'], message: 'Enter the left margin in mm, from 0 to 150' }
	]);
});

it('a choice keeps what can be read and says what cannot', () => {
	const { choice, problems } = readChoice(
		new URLSearchParams('tag=K7M3X, 9QD2A&tag=00000&copies=many&stock=a4')
	);
	expect(choice).toMatchObject({ tag: ['K7M3X', '9QD2A', '00000'], copies: 1, stock: 'a4' });
	expect(problems).toEqual([
		{ field: 'copies', message: 'Enter how many of each as a whole number from 1 to 20' }
	]);
});
