import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { engineLexemes } from '../donors/lexemes';
import { fitOf, measuresAgree, namesEngine, waitsFor, type OpenWant } from './wanted';
import { GRADES } from './words';

const plate = {
	...{ maker: 'Ondrake', model: 'TARN-21L', typeCode: '0417-2', dateCode: '', serial: '' },
	...{ displacementCc: 208, offMachine: 'walk-behind mower', shaft: null }
};
const tarn = { engineKey: 'ondraketarn21l', engineWords: engineLexemes(plate) };
const thing = { kind: 'recoil', ...tarn, words: '', numberKeys: [] as string[] };
const want = { kind: 'recoil', engine: '', measures: '', numberKeys: [] as string[] };

describe('free words name an engine', () => {
	it.each([
		'Ondrake TARN-21L',
		'ondrake tarn 21l',
		'tarn21L',
		'TARN-21',
		'ondrake 21',
		'ondrake',
		'the Ondrake motor'
	])('%s', (said) => expect(namesEngine(said, tarn)).toBe(true));
	it.each([
		'Pellwyn',
		'TARN-22L',
		'ondrake 1',
		'ondrake 3',
		'ondrake 20',
		'ondrake pellwyn',
		'',
		'engine',
		'mower of Ida'
	])('not %s', (said) => expect(namesEngine(said, tarn)).toBe(false));
});

describe('measures agree', () => {
	it.each([
		['40 mm', '40mm', true],
		['3/4 in', '19.1mm', true],
		['3/4', '19mm', true],
		['25 mm', '25.4mm', false],
		['40 mm, 9 teeth', '40mm 9tooth', true],
		['40 mm, 9 teeth', '40mm 10tooth', false],
		['wide', 'wide', false]
	])('%s with %s: %s', (said, words, agree) => expect(measuresAgree(said, words)).toBe(agree));
});

describe('a want is answered', () => {
	it('by its number before its engine, by its engine before its measures, by the kind alone if it asks no more', () => {
		const numbered = { ...thing, numberKeys: ['TN1'] };
		expect(fitOf({ ...want, engine: 'Ondrake', numberKeys: ['TN1'] }, numbered)).toBe(1);
		expect(fitOf({ ...want, kind: '', numberKeys: ['TN1'] }, numbered)).toBe(1);
		expect(fitOf({ ...want, engine: 'TARN-21L', numberKeys: ['TN9'] }, numbered)).toBe(2);
		expect(
			fitOf({ ...want, engine: 'Pellwyn', measures: '40 mm' }, { ...thing, words: '40mm' })
		).toBe(3);
		expect(fitOf(want, thing)).toBe(4);
	});

	it('by nothing of another kind, another engine, another number', () => {
		expect(fitOf({ ...want, kind: 'coil' }, thing)).toBeNull();
		expect(fitOf({ ...want, engine: 'Pellwyn 9' }, thing)).toBeNull();
		expect(fitOf({ ...want, numberKeys: ['TN9'] }, thing)).toBeNull();
		expect(fitOf({ ...want, measures: '40 mm' }, thing)).toBeNull();
		expect(
			fitOf({ ...want, kind: 'coil', numberKeys: ['TN1'] }, { ...thing, numberKeys: ['TN1'] })
		).toBeNull();
	});
});

const open = (number: number, over: Partial<OpenWant> = {}): OpenWant => ({
	...want,
	...{ id: number, number, who: 'customer', job: '', not: [], answered: [] },
	...over
});
const unit = (id: number, grade: (typeof GRADES)[number] = 'usable') => ({
	...thing,
	...{ id, grade, state: 'shelved' as const, inRedBin: false, pulledAt: id }
});

describe('who waits for a part', () => {
	it('is answered by the best unit alone; the next has nobody left', () => {
		const units = [unit(1, 'clean used'), unit(2)];
		const wants = [open(7, { answered: units })];
		expect(units.map((one) => waitsFor(one, wants)?.number ?? null)).toEqual([7, null]);
		const two = [open(7, { answered: units }), open(8, { answered: units })];
		expect(units.map((one) => waitsFor(one, two)?.number ?? null)).toEqual([7, 8]);
	});

	it('does not wait for what lies in the red bin, is held, or was said not to be the one', () => {
		expect(waitsFor({ ...unit(1), inRedBin: true }, [open(7)])).toBeNull();
		expect(waitsFor({ ...unit(1), state: 'back' }, [open(7)])).toBeNull();
		expect(waitsFor(unit(1), [open(7, { not: [1] })])).toBeNull();
	});

	it('are as many units as there are wants, never more', () => {
		const grades = fc.array(fc.constantFrom(...GRADES), { maxLength: 8 });
		fc.assert(
			fc.property(grades, fc.nat(8), (list, count) => {
				const units = list.map((grade, at) => unit(at + 1, grade));
				const wants = Array.from({ length: count }, (_, at) => open(at + 1, { answered: units }));
				const served = units.filter((one) => waitsFor(one, wants));
				expect(served).toHaveLength(Math.min(units.length, count));
				const best = [...units].sort(
					(a, b) => GRADES.indexOf(a.grade) - GRADES.indexOf(b.grade) || a.id - b.id
				);
				expect(new Set(served)).toEqual(new Set(best.slice(0, count)));
			})
		);
	});
});
