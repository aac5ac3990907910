import { describe, expect, it } from 'vitest';
import {
	chanceGood,
	DEFAULT_CHANCES,
	DEFAULT_PROOF_ODDS,
	whyChance,
	type ChanceInput,
	type Proof
} from './index';

const plain: ChanceInput = {
	kindId: 'starter12',
	cause: 'no-oil',
	proofs: [],
	chances: DEFAULT_CHANCES,
	proofOdds: DEFAULT_PROOF_ODDS
};
const passed = (how: Proof['how']): Proof => ({ how, passed: true });
const failed = (how: Proof['how']): Proof => ({ how, passed: false });
const after = (...proofs: Proof[]) => chanceGood({ ...plain, proofs }).chance;

describe('the chance that a part is good', () => {
	it('starts from what the cause leaves', () => {
		expect(chanceGood(plain)).toMatchObject({ chance: 0.6, level: 'medium', ruined: false });
		expect(chanceGood({ ...plain, cause: 'retired' }).chance).toBe(0.9);
		expect(chanceGood({ ...plain, cause: 'flood' }).chance).toBe(0.2);
		expect(chanceGood({ ...plain, cause: null }).chance).toBe(0.6);
	});

	it('takes the worse of two causes', () => {
		expect(chanceGood({ ...plain, secondCause: 'flood' }).level).toBe('low');
		expect(chanceGood({ ...plain, cause: 'flood', secondCause: 'retired' }).level).toBe('low');
	});

	it('goes half the way to not known when a customer only told the cause', () => {
		const told = { ...plain, cause: 'retired', sureness: 'told' } as const;
		expect(chanceGood(told).chance).toBeCloseTo((0.9 + 0.6) / 2, 12);
		expect(chanceGood({ ...told, sureness: 'likely' }).chance).toBe(0.9);
		expect(chanceGood({ ...told, cause: null }).chance).toBe(0.6);
		expect(chanceGood({ ...told, cause: 'flood' }).chance).toBeCloseTo(0.4, 12);
	});

	it('multiplies the odds by the strongest proof alone', () => {
		expect(after(passed('look-over'))).toBeCloseTo((1.5 * 1.5) / (1 + 1.5 * 1.5), 12);
		expect(after(passed('worked in place'))).toBeCloseTo(0.9, 12);
		expect(after(passed('bench test cold'))).toBeCloseTo(15 / 16, 12);
		expect(after(passed('bench test hot'))).toBeCloseTo(37.5 / 38.5, 12);
		expect(after(passed('bench test hot'), passed('look-over'))).toBe(
			after(passed('bench test hot'))
		);
	});

	it('falls to next to nothing with a failed test, until a test is passed after it', () => {
		expect(after(failed('bench test cold'))).toBe(0.02);
		expect(after(passed('bench test hot'), failed('look-over'))).toBe(0.02);
		expect(after(failed('bench test cold'), passed('look-over'))).toBe(0.02);
		expect(after(failed('bench test cold'), passed('bench test hot'))).toBeCloseTo(0.974, 3);
	});

	it('stays ruined, told or not, proved or not', () => {
		const burst = { ...plain, kindId: 'flywheel', cause: 'overspeed' } as const;
		for (const more of [
			{},
			{ sureness: 'told' as const },
			{ proofs: [passed('bench test hot')] }
		]) {
			expect(chanceGood({ ...burst, ...more })).toMatchObject({ chance: 0.02, ruined: true });
		}
		expect(chanceGood({ ...burst, cause: 'retired', secondCause: 'overspeed' }).ruined).toBe(true);
	});

	it('tells its steps', () => {
		const input = { ...plain, sureness: 'told', proofs: [passed('bench test hot')] } as const;
		const { terms, chance } = chanceGood(input);
		expect(terms.map((term) => term.said)).toEqual([
			'ran without oil, seized',
			'only told: the middle between that and not known',
			'bench test hot passed: odds times 25'
		]);
		expect(terms.at(-1)?.value).toBe(chance);
	});

	it('refuses figures out of range and unknown kinds', () => {
		const chances = { ...DEFAULT_CHANCES, high: 1.2 };
		expect(() => chanceGood({ ...plain, chances })).toThrow(RangeError);
		const proofOdds = { ...DEFAULT_PROOF_ODDS, 'look-over': 0 };
		expect(() => chanceGood({ ...plain, proofOdds })).toThrow(RangeError);
		expect(() => chanceGood({ ...plain, kindId: 'nothing' })).toThrow(RangeError);
	});
});

describe('why a part is doubtful', () => {
	it.each([
		['flywheel', 'strike', /hub/],
		['starter12', 'no-oil', /locked/],
		['recoil', 'water', /rust/],
		['coil', 'overheated', /hot/],
		['govgear', 'overspeed', /ran away/],
		['regulator', 'overspeed', /voltage/],
		['lowoil', 'thrown-rod', /did not save/],
		['airbox', 'dirt', /leak/],
		['shroud', 'fire', /aluminium/]
	] as const)('%s after %s', (kindId, cause, said) => {
		expect(whyChance(kindId, cause)).toMatch(said);
	});

	it('has nothing to say where the part is probably fine', () => {
		expect(whyChance('carb-float', 'no-oil')).toBeNull();
		expect(whyChance('plug', 'strike')).toBeNull();
	});
});
