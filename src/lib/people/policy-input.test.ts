import { describe, expect, it } from 'vitest';
import { DEFAULT_POLICY, Policy } from './policy';
import { FIGURES, fieldOf, figureIn, figureTyped } from './policy-figures';
import { FamilyForm, KindForm, kindFiguresOf, ownOf, PolicyForm, policyOf } from './policy-input';

const asTyped = (policy: Policy) =>
	Object.fromEntries(
		FIGURES.map((figure) => [
			fieldOf(figure),
			figureTyped(figureIn(policy, figure), figure.unit, 'USD')
		])
	);
const saved = (typed: Record<string, string>, before: Policy = DEFAULT_POLICY) =>
	policyOf(before, PolicyForm.parse({ version: '0', ...typed }), 'USD');

describe('the page of figures', () => {
	it('asks for every number of the policy but scrap, families and kinds, each once', () => {
		const { scrapKgCents: _s, families: _f, kinds: _k, limits: _l, ...numbers } = DEFAULT_POLICY;
		const all = Object.values(numbers).flatMap((value) =>
			typeof value === 'number' ? [value] : Object.values(value)
		);
		expect(FIGURES).toHaveLength(all.length);
		expect(new Set(FIGURES.map(fieldOf)).size).toBe(all.length);
	});
	it('saved as it stands changes nothing, left empty it is the default', () => {
		const own: Policy = Policy.parse({
			...DEFAULT_POLICY,
			copyCap: 0.725,
			marginCents: 750,
			kinds: { coil: { pullMinutes: 6 } }
		});
		expect(saved(asTyped(own), own)).toEqual(own);
		expect(saved({}, own)).toEqual({ ...DEFAULT_POLICY, kinds: own.kinds });
		expect(ownOf(saved(asTyped(own), own))).toEqual({
			copyCap: 0.725,
			marginCents: 750,
			kinds: own.kinds
		});
	});
	it('takes per cent, money and minutes in the units it shows', () => {
		const policy = saved({
			'shares-good-used': '50 %',
			leastCents: '$12.50',
			'labourHourCents-slow': '18',
			'scrap-Zn': '0.70'
		});
		expect(policy.shares['good used']).toBe(0.5);
		expect([policy.leastCents, policy.labourHourCents.slow, policy.scrapKgCents.Zn]).toEqual([
			1250, 1800, 70
		]);
		expect(Policy.safeParse(policy).success).toBe(true);
	});
	it('a figure sent back to its default leaves the others', () => {
		const policy = saved({ copyCap: '50', leastCents: '20', reset: 'copyCap' });
		expect([policy.copyCap, policy.leastCents]).toEqual([0.8, 2000]);
	});
	it.each([
		['copyCap', '101', 'At most this share of a copy'],
		['dyingRate', '100', 'Becomes unsellable'],
		['staleDays', '1.5', 'whole number from 1 to 3650'],
		['stepLowCents', '0', 'Small step'],
		['keepMinutes', 'four', 'Look, photo and tag']
	])('%s = %s is refused in the words of its label', (field, typed, words) => {
		const parsed = PolicyForm.safeParse({ version: '0', [field]: typed });
		expect(parsed.error?.issues[0]?.path).toEqual([field]);
		expect(parsed.error?.issues[0]?.message).toContain(words);
	});
});

describe('families and kinds', () => {
	it('an engine is asked for in words', () => {
		expect(FamilyForm.safeParse({ version: 1, engine: ' - ', mark: 'lots' }).success).toBe(false);
		expect(
			FamilyForm.safeParse({ version: 1, engine: 'Ondrake TARN-21L', mark: 'lots' }).success
		).toBe(true);
	});
	it('only what is typed becomes the own figure of a kind', () => {
		const form = KindForm.parse({
			version: 1,
			kind: 'coil',
			callsPerYear: '2.5',
			kitCents: '3',
			comeBack: '4',
			size: 's'
		});
		expect(kindFiguresOf(form, 'USD')).toEqual({
			callsPerYear: 2.5,
			kitCents: 300,
			comeBack: 0.04,
			size: 's'
		});
		expect(KindForm.safeParse({ version: 1, kind: 'nothing' }).success).toBe(false);
	});
});
