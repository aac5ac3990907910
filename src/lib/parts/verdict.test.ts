import { DEFAULT_POLICY, type Policy } from '$lib/people/policy';
import { gain } from '$lib/worth';
import { kind, type CauseId } from '$lib/trade';
import { describe, expect, it } from 'vitest';
import { demoDonors } from '../../../fixtures/demo-donors';
import { demoParts, type DemoPart } from '../../../fixtures/demo-parts';
import type { Season } from '$lib/people/settings';
import { gainInput, isTested, priceAt } from './verdict-inputs';
import { verdictOf } from './verdict';
import { evenSaid, termSaid } from './verdict-said';
import type { VerdictSubject } from './verdict-view';

const PRICE = {
	newCents: 10000,
	copyCents: null,
	source: 'Counter book',
	seenOn: '2026-03-03',
	stale: false
};

const subject = (over: Partial<VerdictSubject> = {}): VerdictSubject => ({
	kind: 'coil',
	grade: 'untested',
	cause: 'thrown-rod',
	secondCause: null,
	sureness: 'seen',
	proofs: [],
	place: 1,
	have: 1,
	price: PRICE,
	massGrams: null,
	litres: null,
	bin: null,
	stillOn: false,
	family: 'some',
	waiting: false,
	...over
});

const verdict = (
	over: Partial<VerdictSubject> = {},
	policy: Policy = DEFAULT_POLICY,
	season: Season = 'normal'
) => verdictOf(subject(over), policy, season);

const demoSubject = (part: DemoPart): VerdictSubject => {
	const donor = demoDonors.find(({ number }) => number === part.donor)!;
	return subject({
		kind: part.kind,
		grade: part.grade,
		cause: donor.cause as CauseId,
		proofs: part.proof ? [{ how: part.proof, passed: true }] : [],
		price: { ...PRICE, newCents: part.newCents, copyCents: part.copyCents },
		massGrams: part.massGrams
	});
};

/*
 * How the counts below are meant: every part of the shop with place 1, whatever its state, off its donor
 * (nothing to spend now), at the grade its tag says, the minutes of its kind, its own weight. A passed
 * bench test leaves nothing to do; all others still wait for their test, the one that is never kept too.
 */
describe('the demo shop comes out as a mechanic would expect', () => {
	const counted = (season: Season) => {
		const words = demoParts.map(
			(part) => verdictOf(demoSubject(part), DEFAULT_POLICY, season).verdict
		);
		return ['keep', 'close call', 'let it go', 'never', 'needs a price'].map(
			(word) => words.filter((each) => each === word).length
		);
	};
	const waiting = demoParts.map(demoSubject).filter((part) => !isTested(part));
	const today = (season: Season) =>
		waiting.filter((part) => {
			const word = verdictOf(part, DEFAULT_POLICY, season);
			if (word.verdict !== 'never') return word.timing === 'now';
			const { usedCents } = priceAt(part.grade, part.price!, DEFAULT_POLICY);
			return gain(gainInput(part, DEFAULT_POLICY, season, usedCents)).timing === 'now';
		}).length;

	it.each([
		['slow', [37, 13, 9, 1, 0]],
		['normal', [32, 18, 9, 1, 0]],
		['rush', [32, 18, 9, 1, 0]]
	] as const)('season %s: keep, close call, let it go, never', (season, expected) => {
		expect(counted(season)).toEqual(expected);
	});

	it('47 wait for their test; when to do it follows the season', () => {
		expect(waiting).toHaveLength(47);
		expect([today('slow'), today('normal'), today('rush')]).toEqual([37, 1, 0]);
	});

	it('cheap carburetors with a copy go, flywheels of an overspeed engine never stay, the dear and good are kept', () => {
		const of = (oldId: string) =>
			verdictOf(
				demoSubject(demoParts.find((part) => part.oldId === oldId)!),
				DEFAULT_POLICY,
				'normal'
			).verdict;
		expect([of('P001'), of('P010'), of('P051')]).toEqual(['let it go', 'let it go', 'let it go']);
		expect(of('P050')).toBe('never');
		expect([of('P040'), of('P017'), of('P031'), of('P042')]).toEqual([
			'keep',
			'keep',
			'keep',
			'keep'
		]);
	});
});

describe('a verdict', () => {
	it('is never for a kind that is not used again and for a ruined one, whatever it would bring', () => {
		const dear = { ...PRICE, newCents: 900_000 };
		expect(verdict({ kind: 'fuel-hose', price: dear })).toMatchObject({
			verdict: 'never',
			gainCents: null
		});
		const flywheel = verdict({ kind: 'flywheel', cause: 'overspeed', price: dear });
		expect(flywheel.verdict).toBe('never');
		expect(flywheel.reason).toContain('overspeed');
		expect(
			verdict({ kind: 'flywheel', cause: 'retired', secondCause: 'overspeed' }).reason
		).toContain('overspeed');
	});

	it('needs a price without one, and says from which new price it pays', () => {
		const without = verdict({ price: null });
		expect(without).toMatchObject({
			verdict: 'needs a price',
			gainCents: null,
			askedCents: null,
			timing: null
		});
		const even = without.breakEvenNewCents!;
		const at = (newCents: number) => verdict({ price: { ...PRICE, newCents } }).gainCents!;
		// the asked price is rounded to a whole dollar: look a step to either side
		expect(at(even + 200)).toBeGreaterThan(0);
		expect(at(even - 200)).toBeLessThan(0);
	});

	it('is rough only where both ends of what the kind costs agree', () => {
		expect(verdict({ kind: 'genhead', cause: 'retired', price: null }).rough).toBe('keep');
		expect(verdict({ kind: 'exgasket', price: null }).rough).toBeNull();
		expect(verdict({ kind: 'carb-float', price: null }).rough).toBeNull();
		expect(verdict({ kind: 'fuel-valve', cause: 'stale-fuel', price: null }).rough).toBe(
			'let it go'
		);
	});

	it('prices a part that waits for its test at the grade it will have if it passes', () => {
		const high = verdict({ cause: 'thrown-rod' });
		expect(high).toMatchObject({ askedGrade: 'clean used', askedCents: 6000, untestedCents: 2500 });
		expect(verdict({ cause: 'overheated' })).toMatchObject({
			askedGrade: 'good used',
			askedCents: 4500
		});
		expect(verdict({ cause: 'flood' })).toMatchObject({ askedGrade: 'usable', askedCents: 3000 });
		expect(verdict({ grade: 'good used' })).toMatchObject({
			askedCents: 4500,
			untestedCents: null
		});
	});

	it('after a passed bench test has nothing left to do and no timing', () => {
		const proofs = [{ how: 'bench test hot', passed: true }] as const;
		const tested = verdict({ grade: 'good used', proofs });
		expect(tested.timing).toBeNull();
		expect(tested.figures?.input.minutesLater).toBe(0);
		expect(tested.gainCents).toBeGreaterThan(verdict({ grade: 'good used' }).gainCents!);
		const failedSince = [...proofs, { how: 'bench test cold', passed: false }] as const;
		expect(verdict({ grade: 'good used', proofs: failedSince }).figures?.input.chanceGood).toBe(
			0.02
		);
	});

	it('does the work when called where cleaning does not keep, even at no wage', () => {
		const free: Policy = {
			...DEFAULT_POLICY,
			labourHourCents: { normal: 3400, slow: 0, rush: 7800 }
		};
		const carb = verdict(
			{ kind: 'carb-float', price: { ...PRICE, newCents: 30000 } },
			free,
			'slow'
		);
		expect(carb.timing).toBe('when-called');
		const { whenCalled, now, scrap } = carb.figures!.terms;
		expect(now).toBeGreaterThan(whenCalled);
		expect(carb.gainCents).toBe(Math.round(whenCalled - scrap));
	});

	it('pays for pulling at the rate of the season while it is still on its donor, and not after', () => {
		const on = verdict({ stillOn: true }, DEFAULT_POLICY, 'slow').figures!.input;
		expect(on.minutesNow).toBe(3 + 4);
		expect(on.labourNow).toBeCloseTo(2000 / 60);
		expect(on.labour).toBeCloseTo(3400 / 60);
		expect(verdict().figures!.input.minutesNow).toBe(0);
	});

	it('counts family, ageing, own figures, weight, bin and a waiting customer', () => {
		const input = (over: Partial<VerdictSubject>, policy?: Policy) =>
			verdict(over, policy).figures!.input;
		expect(input({ family: 'lots' }).callsPerYear).toBeCloseTo(3 * 0.98);
		expect(input({ family: 'hardly' }).callsPerYear).toBeCloseTo(0.3 * 0.98);
		expect(input({}).dyingRate).toBeCloseTo(-Math.log(0.85));
		expect(input({ kind: 'fuel-pump', cause: 'retired' }).dyingRate).toBeCloseTo(
			-Math.log(kind('fuel-pump').ages ? 0.7 : 0.85)
		);
		expect(
			input({}, { ...DEFAULT_POLICY, kinds: { coil: { callsPerYear: 5 } } }).callsPerYear
		).toBe(5);
		expect(input({}).scrapCents).toBeCloseTo(0.35 * 57.5);
		expect(input({ massGrams: 1000 }).scrapCents).toBeCloseTo(57.5);
		expect(
			input({ massGrams: 1000 }, { ...DEFAULT_POLICY, scrapKgCents: { 'Cu-M': 80 } }).scrapCents
		).toBeCloseTo(80);
		expect(input({}).shelfCents).toBe(80);
		expect(input({ litres: 2, bin: { litres: 20, yearlyCostCents: 900 } }).shelfCents).toBeCloseTo(
			90
		);
		expect(input({ waiting: true }).waiting).toBe(0.7);
		expect(input({}).comeBackCents).toBeCloseTo((30 * 3400) / 60);
	});

	it('says when the copy leaves no new price that pays', () => {
		const capped = verdict({
			kind: 'carb-float',
			price: { ...PRICE, newCents: 5800, copyCents: 1900 }
		});
		expect(capped).toMatchObject({
			verdict: 'let it go',
			breakEvenNewCents: null,
			copyBinds: true
		});
		expect(evenSaid(capped, (cents) => `$${cents / 100}`)).toBe(
			'No new price makes it pay while the copy costs $19.'
		);
	});

	it('opens to terms that each name their source', () => {
		const own = { ...DEFAULT_POLICY, shares: { ...DEFAULT_POLICY.shares, 'clean used': 0.5 } };
		const { terms, gainCents } = verdict({ cause: 'thrown-rod' }, own);
		const of = (said: string) => terms.find((term) => term.said.startsWith(said));
		expect(of('A new one costs')).toMatchObject({
			value: 10000,
			source: 'Counter book, seen 3 March 2026'
		});
		expect(of('Share of new')).toMatchObject({ value: 0.5, source: "the shop's own" });
		expect(of('Good when fitted')?.source).toBe('thrown rod, hole in block: high (policy default)');
		expect(of('Calls for it')?.source).toBe("the kind's usual");
		expect(of('Gain over')?.value).toBe(gainCents);
		const noOil = verdict({ kind: 'starter12', cause: 'no-oil' }).terms.find(
			({ said }) => said === 'Good when fitted'
		);
		expect(termSaid(noOil!, 'USD')).toBe('60%');
		expect(noOil!.source).toContain('ran without oil, seized: medium');
	});

	it('computes even where nothing wears and nobody calls', () => {
		const still = {
			...DEFAULT_POLICY,
			moneyRate: 0,
			dyingRate: 0,
			kinds: { coil: { callsPerYear: 0 } }
		};
		expect(verdict({}, still)).toMatchObject({ verdict: 'let it go', waitYears: null });
	});
});
