import { describe, expect, it } from 'vitest';
import { EditForm, LogForm, SellForm } from './form';
import { Hold, Pull } from './input';

const faults = (result: { error?: { issues: { message: string }[] } | undefined }) =>
	result.error?.issues.map((issue) => issue.message) ?? [];

describe('logging', () => {
	it('needs a kind and a grade, nothing else', () => {
		expect(Pull.parse({ kind: 'coil', grade: 'usable' })).toEqual({
			kind: 'coil',
			grade: 'usable'
		});
		expect(faults(Pull.safeParse({ kind: 'coil' }))).toEqual(['Choose a grade']);
		expect(faults(Pull.safeParse({ grade: 'usable' }))).toContain('Choose what kind of part it is');
		expect(faults(Pull.safeParse({ kind: 'elbow', grade: 'usable' }))).toEqual([
			'Choose a kind from the list'
		]);
	});

	it('takes what goes straight to scrap without a grade', () => {
		expect(Pull.parse({ kind: 'rod', scrapped: { reason: 'never again' } }).grade).toBeUndefined();
	});

	it('reads the flat fields of a form', () => {
		const typed = {
			kind: 'coil',
			grade: 'good used',
			numbers: 'TN-4471, 88-10\n88-10',
			how: 'bench test hot',
			figure: '10.5',
			unit: 'kV',
			passed: 'yes',
			massGrams: '260',
			checklist: 'one tick'
		};
		expect(LogForm.parse(typed)).toMatchObject({
			numbers: ['TN-4471', '88-10'],
			proof: { how: 'bench test hot', figure: 10.5, unit: 'kV', passed: true },
			massGrams: 260,
			checklist: ['one tick'],
			scrapped: undefined
		});
	});

	it('reads the scrap buttons of a form', () => {
		expect(LogForm.parse({ kind: 'rod', scrap: 'destroy', reason: 'cracked' }).scrapped).toEqual({
			reason: 'cracked',
			destroyed: true
		});
	});
});

describe('selling', () => {
	it.each([
		['46', 46],
		['46.5', 46.5],
		['46,50', 46.5],
		['0', 0],
		['$1,200.00', 1200]
	])('%s is %f', (price, amount) => expect(SellForm.parse({ price }).price).toBe(amount));

	it.each(['', 'much', '-4', '1e3', '2000000'])('asks again for %s', (price) =>
		expect(faults(SellForm.safeParse({ price }))).toEqual(['Enter the price like 46 or 46.50'])
	);
});

it('an edit by form empties what was left empty', () => {
	expect(EditForm.parse({ version: '3', label: 'nine teeth' })).toEqual({
		version: 3,
		label: 'nine teeth',
		numbers: [],
		massGrams: null,
		note: '',
		set: '',
		setMissing: '',
		engine: ''
	});
});

it('a hold ends on a day or at a moment', () => {
	expect(Hold.safeParse({ for: 'job 1312', until: '2026-03-20' }).success).toBe(true);
	expect(Hold.safeParse({ for: 'job 1312', until: '2026-03-20T10:00:00Z' }).success).toBe(true);
	expect(faults(Hold.safeParse({ for: 'job 1312', until: 'soon' }))).toEqual([
		'Enter the date it is held until'
	]);
	expect(faults(Hold.safeParse({}))).toEqual(['Say who or which job it is held for']);
});
