import { DEFAULT_POLICY } from '$lib/people/policy';
import { describe, expect, it } from 'vitest';
import { demoDonors } from '../../../fixtures/demo-donors';
import { subjectsOn } from '../../../tests/support/demo-subjects';
import type { CauseId, EngineClass } from '$lib/trade';
import { choicesOf, decisionFigures } from './choices';
import { ChoiceFigures, minutesIn, typedFigures } from './choices-form';
import { choiceRows, tipsSaid } from './choices-said';
import { planOf } from './plan';
import type { GivenFigures } from './choices-view';

const planned = new Map<number, number>();
function stripTotal(number: number): number {
	const known = planned.get(number);
	if (known !== undefined) return known;
	const { totalCents } = planOf(subjectsOn(number), DEFAULT_POLICY, 'normal');
	planned.set(number, totalCents);
	return totalCents;
}

const donor = (number: number, family: 'lots' | 'some' = 'some') => {
	const { engineClass, cause } = demoDonors.find((each) => each.number === number)!;
	return {
		engineClass: engineClass as EngineClass,
		cause: cause as CauseId,
		secondCause: null,
		family,
		subjects: subjectsOn(number),
		stripTotalCents: stripTotal(number)
	};
};
const choices = (number: number, given: GivenFigures = {}) =>
	choicesOf(donor(number), DEFAULT_POLICY, 'normal', given);
const figures = (number: number, family: 'lots' | 'some' = 'some') =>
	decisionFigures(donor(number, family), DEFAULT_POLICY, 'normal');
const say = (cents: number) => `$${Math.round(cents / 100)}`;

describe('the five choices for a donor', () => {
	it('all five, best first', () => {
		for (const number of [1, 4, 5, 8]) {
			const cents = choices(number).choices.map((each) => each.cents);
			expect(cents).toHaveLength(5);
			expect(cents).toEqual(cents.toSorted((a, b) => b - a));
		}
	});

	it('as a mechanic would expect: a seized rider is stripped, a blown head gasket mended', () => {
		expect(choices(4).choices[0]!.choice).toBe('strip');
		expect(choices(4).choices.at(-1)!.choice).toBe('fix');
		expect(choices(5).choices[0]!.choice).toBe('fix');
	});

	it('what was given counts in place of the usual', () => {
		expect(choices(4, { fixedPriceCents: 200_000 }).choices[0]!.choice).toBe('fix');
		const { figures, given } = choices(4, { wholePriceCents: 30_000 });
		expect(figures).toMatchObject({ wholePriceCents: 30_000 });
		expect(given).toEqual(['wholePriceCents']);
	});

	it('the season moves labour and handling, the family how soon a buyer comes', () => {
		const rush = decisionFigures(donor(4), DEFAULT_POLICY, 'rush');
		expect(rush.labourCents).toBeGreaterThan(figures(4).labourCents);
		expect(rush.handlingCents).toBeGreaterThan(figures(4).handlingCents);
		expect(figures(4, 'lots').wholeReach).toBeGreaterThan(figures(4).wholeReach);
	});

	it('two causes need both repairs and hold no better than the worse', () => {
		const both = { ...donor(4), secondCause: 'valve' as const };
		const two = decisionFigures(both, DEFAULT_POLICY, 'normal');
		expect(two.newPartsCents).toBeGreaterThan(figures(4).newPartsCents);
		expect(two.fixChance).toBe(figures(4).fixChance);
	});
});

describe('what would tip it', () => {
	it('is said in words, once for each rival, and it does', () => {
		const said = tipsSaid(choices(4), say);
		expect(said[0]).toBe('Stripping beats fixing until the repair costs under $85.');
		expect(new Set(said.map((each) => each.split(' until ')[0])).size).toBe(said.length);
		expect(choices(4, { newPartsCents: 8400, labourCents: 0 }).choices[0]!.choice).toBe('fix');
		expect(choices(4, { newPartsCents: 4400, labourCents: 4000 }).choices[0]!.choice).toBe('fix');
		expect(choices(4, { newPartsCents: 8700, labourCents: 0 }).choices[0]!.choice).toBe('strip');
	});

	it('and every term stands behind it', () => {
		const rows = choiceRows(figures(4), say);
		expect(rows.map(({ what }) => what)).toContain('Yard until it is looked at again');
		expect(rows.find(({ what }) => what === 'New parts')!.value).toMatch(/^\$-/);
	});
});

describe('figures as people give them', () => {
	const typed = (address: string) => typedFigures(new URLSearchParams(address), 'USD');

	it('per cent and amounts, what is empty is usual', () => {
		expect(typed('chance=70%25&parts=120.50&labour=&dead=60')).toEqual({
			given: { fixChance: 0.7, newPartsCents: 12_050, wholePriceCents: 6000 },
			problems: []
		});
	});

	it('says of each what to put right', () => {
		const { given, problems } = typed('chance=170&running=much');
		expect(given).toEqual({});
		expect(problems.map(({ field }) => field)).toEqual(['chance', 'running']);
		expect(problems[1]!.message).toBe('Enter “Price of it running” as an amount, like 46 or 46.50');
	});

	it('scripts give cents and shares; minutes are none without a limit', () => {
		expect(ChoiceFigures.safeParse({ fixChance: '1.2' }).error!.issues[0]!.message).toBe(
			'Enter the chance as a number from 0 to 1'
		);
		expect(ChoiceFigures.parse({ newPartsCents: '1200' })).toEqual({ newPartsCents: 1200 });
		expect(minutesIn(new URLSearchParams('minutes=30'))).toBe(30);
		for (const none of ['', 'minutes=', 'minutes=x', 'minutes=-5', 'minutes=1e9'])
			expect(minutesIn(new URLSearchParams(none))).toBeNull();
	});
});
