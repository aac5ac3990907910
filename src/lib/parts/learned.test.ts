import { DEFAULT_POLICY } from '$lib/people/policy';
import { kinds } from '$lib/trade';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { callsFor, chancesFor, comeBackFor, shareFor, withHistory } from './learned';
import type { CallsSeen, Observed, SaleSeen, TestsSeen } from './learned-view';
import { taughtRows } from './taught';
import { verdictOf } from './verdict';
import type { VerdictSubject } from './verdict-view';
import { GRADES } from './words';

const NOTHING: Observed = { tests: [], outs: [], calls: [], asked: [], sales: [] };
const of = (over: Partial<Observed>) => withHistory(DEFAULT_POLICY, { ...NOTHING, ...over });
const { priors } = DEFAULT_POLICY;

const tests = (passed: number, failed: number, over: Partial<TestsSeen> = {}): TestsSeen => ({
	...{ kind: 'starter12', cause: 'no-oil', secondCause: null, sureness: 'seen' },
	...{ passed, failed },
	...over
});
const calls = (engineKey: string, calls: number, years: number): CallsSeen => ({
	...{ kind: 'coil', engineKey },
	...{ calls, years }
});
const sale = (paidCents: number, copyCents: number | null = null): SaleSeen => ({
	...{ grade: 'good used', newCents: 10_000 },
	...{ paidCents, copyCents }
});
const subject = (over: Partial<VerdictSubject> = {}): VerdictSubject => ({
	...{ kind: 'starter12', grade: 'untested', cause: 'no-oil', secondCause: null },
	...{ sureness: 'seen', proofs: [], place: 1, have: 1, massGrams: null, litres: null, bin: null },
	...{ stillOn: false, family: 'some', engineKey: 'ondraketarn21l', waiting: false },
	price: {
		...{ newCents: 14_000, copyCents: null, source: 'Counter book' },
		...{ seenOn: '2026-03-03', stale: false }
	},
	...over
});

describe('a shop without a history', () => {
	const none = of({});

	it('counts with the usual figures to the letter', () => {
		for (const { id, comeBack, callsPerYear } of kinds) {
			expect(chancesFor(id, none)).toEqual(DEFAULT_POLICY.chances);
			expect(comeBackFor(id, none)).toBe(comeBack);
			const family = { kind: id, engineKey: 'ondraketarn21l', family: 'some' } as const;
			expect(callsFor(family, none)).toBe(callsPerYear);
		}
		for (const grade of GRADES) expect(shareFor(grade, none)).toBe(DEFAULT_POLICY.shares[grade]);
		expect(taughtRows(NOTHING, none.taught)).toEqual([]);
	});

	it('has the verdicts of its policy alone, terms and all', () => {
		const alone = verdictOf(subject(), DEFAULT_POLICY, 'normal');
		expect(verdictOf(subject(), none, 'normal')).toEqual(alone);
	});
});

describe('bench tests', () => {
	it('move the chance of their kind and level alone', () => {
		const figures = of({ tests: [tests(9, 5)] });
		const chances = chancesFor('starter12', figures);
		expect(chances.medium).toBeCloseTo((4 * 0.6 + 9) / (4 + 14), 12);
		expect(chances).toMatchObject({ high: 0.9, low: 0.2, ruined: 0.02 });
		expect(chancesFor('coil', figures)).toEqual(DEFAULT_POLICY.chances);
	});

	it('are told in the terms of the verdict, with their interval', () => {
		const { terms } = verdictOf(subject(), of({ tests: [tests(9, 5)] }), 'normal');
		const good = terms.find(({ said }) => said === 'Good when fitted')!;
		expect(good.value).toBeCloseTo(11.4 / 18, 12);
		expect(good.source).toBe(
			'ran without oil, seized: medium; 14 tested here, between 41 and 83% (policy default)'
		);
	});

	it('of the part itself count as its own proof and not once more', () => {
		const proofs = [{ how: 'bench test cold', passed: true }] as const;
		const alone = verdictOf(subject({ proofs }), DEFAULT_POLICY, 'normal');
		const own = verdictOf(subject({ proofs }), of({ tests: [tests(1, 0)] }), 'normal');
		expect(own).toEqual(alone);
		const others = verdictOf(subject({ proofs }), of({ tests: [tests(9, 5)] }), 'normal');
		const good = others.terms.find(({ said }) => said === 'Good when fitted')!;
		expect(good.source).toContain('13 tested here');
		const odds = (10 * (2.4 + 8)) / (1.6 + 5);
		expect(good.value).toBeCloseTo(odds / (1 + odds), 12);
	});

	it('of two causes speak for the worse, of one that was only told half for not known', () => {
		const two = of({ tests: [tests(4, 0, { cause: 'retired', secondCause: 'flood' })] });
		expect(chancesFor('starter12', two).low).toBeCloseTo((0.8 + 4) / 8, 12);
		const told = of({ tests: [tests(0, 4, { cause: 'flood', sureness: 'told' })] });
		expect(chancesFor('starter12', told).low).toBeCloseTo(0.8 / 6, 12);
		expect(chancesFor('starter12', told).medium).toBeCloseTo(2.4 / 6, 12);
	});

	it('never make a ruined part good', () => {
		const burst = { kind: 'flywheel', cause: 'overspeed' } as const;
		const figures = of({ tests: [tests(50, 0, burst)] });
		expect(chancesFor('flywheel', figures).ruined).toBe(0.02);
		expect(verdictOf(subject(burst), figures, 'normal').verdict).toBe('never');
	});
});

describe('what went out', () => {
	it('comes back as often as it did here, slowly', () => {
		const usual = comeBackFor('coil', of({}));
		const figures = of({ outs: [{ kind: 'coil', out: 10, back: 3 }] });
		expect(comeBackFor('coil', figures)).toBeCloseTo((20 * usual + 3) / 30, 12);
	});

	it('is called for on this engine as it was here, and for its kind as on all others', () => {
		const usual = callsFor({ kind: 'coil', engineKey: '', family: 'some' }, of({}));
		const figures = of({ calls: [calls('a', 6, 2), calls('b', 1, 3), calls('', 2, 1)] });
		const on = (engineKey: string) =>
			callsFor({ kind: 'coil', engineKey, family: 'some' }, figures);
		const others = (10 + 3) / (10 / usual + 4);
		expect(on('a')).toBeCloseTo((10 + 6) / (10 / others + 2), 12);
		expect(on('never seen')).toBeCloseTo((10 + 9) / (10 / usual + 6), 12);
		expect(on('')).toBe(on('never seen'));
	});

	it('says how many calls in how long stand behind it', () => {
		const figures = of({ calls: [calls('ondraketarn21l', 3, 1.2), calls('b', 1, 4)] });
		const { terms } = verdictOf(subject({ kind: 'coil' }), figures, 'normal');
		const source = terms.find(({ said }) => said === 'Calls for it')!.source;
		expect(source).toContain(
			"the kind's usual; 3 taken for this engine in 14 months, 1 for other engines together in 4 years, between "
		);
		const none = of({ calls: [calls('ondraketarn21l', 0, 3)] });
		const [said] = verdictOf(subject({ kind: 'coil' }), none, 'normal')
			.terms.filter((term) => term.said === 'Calls for it')
			.map((term) => term.source);
		expect(said).toContain('; 0 taken for this engine in 3 years, between ');
		const other = { kind: 'flywheel', engineKey: 'ondraketarn21l', calls: 4, years: 5 };
		const near = verdictOf(subject({ kind: 'coil' }), of({ calls: [other] }), 'normal');
		expect(near.terms.find((term) => term.said === 'Calls for it')!.source).toMatch(
			/; 4 for other parts of this engine where [\d.]+ would be usual, 4 for all other kinds where [\d.]+ would be usual, between /
		);
		const [row] = taughtRows({ ...NOTHING, calls: [calls('b', 9, 2)] }, figures.taught);
		expect(row!.seen).toBe('4 taken in 5.2 years');
	});

	it('counts engines of which lots or hardly any are about as that many ordinary ones', () => {
		const policy = { ...DEFAULT_POLICY, families: { many: 'lots' } as const };
		const figures = withHistory(policy, { ...NOTHING, calls: [calls('many', 6, 2)] });
		const on = (engineKey: string, family: 'lots' | 'some') =>
			callsFor({ kind: 'coil', engineKey, family }, figures);
		const usual = callsFor({ kind: 'coil', engineKey: '', family: 'some' }, policy);
		expect(on('few', 'some')).toBeCloseTo((10 + 6) / (10 / usual + 6), 12);
		expect(on('many', 'lots')).toBeCloseTo((10 + 6) / (10 / (3 * usual) + 2), 12);
	});
});

describe('what was paid', () => {
	it('moves the share of its grade', () => {
		const figures = of({ sales: [sale(5000), sale(5500), sale(20_000)] });
		expect(shareFor('good used', figures)).toBeCloseTo((5 * 0.45 + 0.5 + 0.55 + 1) / 8, 12);
		expect(shareFor('clean used', figures)).toBe(0.6);
	});

	it('says nothing where a copy held the price down', () => {
		expect(shareFor('good used', of({ sales: [sale(1500, 2000)] }))).toBe(0.45);
		expect(shareFor('good used', of({ sales: [sale(1500, 9000)] }))).toBeLessThan(0.45);
	});
});

describe('few never swing it', () => {
	const count = fc.integer({ min: 0, max: 60 });
	const most = (seen: number, worth: number) => seen / (seen + worth) + 1e-12;

	it('a chance and a share of come-backs move at most by n of n and their worth', () => {
		fc.assert(
			fc.property(count, count, (yes, no) => {
				const { medium } = chancesFor('starter12', of({ tests: [tests(yes, no)] }));
				expect(Math.abs(medium - 0.6)).toBeLessThanOrEqual(most(yes + no, priors.chance));
				const usual = comeBackFor('coil', of({}));
				const back = comeBackFor('coil', of({ outs: [{ kind: 'coil', out: yes + no, back: no }] }));
				expect(Math.abs(back - usual)).toBeLessThanOrEqual(most(yes + no, priors.comeBacks));
			})
		);
	});

	it('calls move at most by that much of the way to what was seen', () => {
		const years = fc.double({ min: 0, max: 30, noNaN: true });
		fc.assert(
			fc.property(count, years, (seen, watched) => {
				const at = { kind: 'coil', engineKey: 'a', family: 'some' } as const;
				const usual = callsFor(at, of({}));
				const moved = Math.abs(callsFor(at, of({ calls: [calls('a', seen, watched)] })) - usual);
				const way = Math.abs(seen - usual * watched) / (watched + priors.calls / usual);
				expect(moved).toBeLessThanOrEqual(way + 1e-9);
			})
		);
	});

	it('a share of new moves at most by n of n and its worth', () => {
		const paid = fc.array(fc.integer({ min: 1, max: 20_000 }), { maxLength: 40 });
		fc.assert(
			fc.property(paid, (list) => {
				const share = shareFor('good used', of({ sales: list.map((cents) => sale(cents)) }));
				expect(Math.abs(share - 0.45)).toBeLessThanOrEqual(most(list.length, priors.shareSales));
			})
		);
	});

	it('a search in vain counts for part of a call, in the years in which none stood ready', () => {
		const taken = { kind: 'coil', engineKey: 'a', calls: 2, years: 1 };
		const sought = { kind: 'coil', engineKey: 'a', sought: 5, wanted: 1, years: 2 };
		const sold = { ...taken, calls: 4, years: 3 };
		const vain = of({ calls: [taken], asked: [sought] }).taught.calls('coil', 'a', 'some');
		expect(vain.mean).toBeCloseTo(of({ calls: [sold] }).taught.calls('coil', 'a', 'some').mean, 12);
		expect(of({ asked: [sought] }).taught.calls('coil', 'b', 'some').mean).not.toBe(vain.mean);
	});

	it('an interval holds its figure, and narrows', () => {
		fc.assert(
			fc.property(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 1, max: 30 }), (yes, no) => {
				const at = (times: number) =>
					of({ tests: [tests(yes * times, no * times)] }).taught.chance('starter12', 'medium');
				const { low, mean, high } = at(1);
				expect(low).toBeLessThan(mean);
				expect(mean).toBeLessThan(high);
				expect(at(20).high - at(20).low).toBeLessThan(high - low);
			}),
			{ numRuns: 30 }
		);
	});
});

it('the figures moved most come first', () => {
	const seen: Observed = {
		tests: [tests(1, 1), tests(0, 30, { kind: 'coil' })],
		outs: [{ kind: 'coil', out: 40, back: 0 }],
		calls: [calls('a', 200, 2)],
		asked: [],
		sales: [sale(6000)]
	};
	const rows = taughtRows(seen, of(seen).taught);
	const moved = rows.map((row) => row.moved);
	expect(moved).toEqual([...moved].sort((a, b) => b - a));
	expect(rows[0]).toMatchObject({ figure: 'Calls a year, ordinary engine' });
	expect(rows.map(({ of, figure }) => `${of}: ${figure}`)).toContain('good used: Share of new');
});
