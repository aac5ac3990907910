import { DEFAULT_POLICY } from '$lib/people/policy';
import { kind, standsBefore } from '$lib/trade';
import { describe, expect, it } from 'vitest';
import { subjectsOn } from '../../../tests/support/demo-subjects';
import { plannable, planOf, planPart } from './plan';
import { belowSaid, planSaid, stepSaid, ticksTo } from './plan-said';
import { verdictOf } from './verdict';

const plan = (donor: number, minutes: number | null = null, policy = DEFAULT_POLICY) =>
	planOf(subjectsOn(donor), policy, 'normal', minutes);
/** Each plan once: a donor has some sixty kinds. */
const made = new Map<string, ReturnType<typeof plan>>();
const usual = (donor: number, minutes: number | null = null) => {
	const key = `${donor} ${minutes}`;
	const found = made.get(key) ?? plan(donor, minutes);
	made.set(key, found);
	return found;
};
const ids = (steps: { id: string }[]) => steps.map(({ id }) => id);
const say = (cents: number) => `$${Math.round(cents / 100)}`;
const DONORS = [1, 3, 5, 8];

describe('the pull plan of a donor', () => {
	it.each(DONORS)('D%i: takes off first what stands before, within the minutes', (donor) => {
		const there = subjectsOn(donor).map(({ kind }) => kind);
		for (const minutes of [15, 30, 60, null]) {
			const { order, ...all } = usual(donor, minutes);
			const off = ids(order);
			order.forEach(({ id }, at) => {
				const before = standsBefore(id, there);
				expect(off.slice(0, at)).toEqual(expect.arrayContaining(before));
			});
			expect(all.minutes).toBeLessThanOrEqual(minutes ?? Infinity);
			expect(order.at(-1)?.runningCents ?? 0).toBe(all.totalCents);
			expect(ids(all.below).filter((id) => off.includes(id))).toEqual([]);
		}
	});

	it('more minutes never bring less, and no limit most', () => {
		for (const donor of DONORS) {
			const totals = [15, 30, 60, null].map((minutes) => usual(donor, minutes).totalCents);
			expect(totals).toEqual(totals.toSorted((a, b) => a - b));
		}
	});

	it('a dear minute moves the stop line up, and it says so', () => {
		const all = (season: 'slow' | 'normal' | 'rush') =>
			planOf(subjectsOn(5), DEFAULT_POLICY, season).minutes;
		expect(all('slow')).toBeGreaterThan(all('normal'));
		expect(all('normal')).toBeGreaterThan(all('rush'));
		expect(planSaid(usual(5, 30), say)).toBe(
			'30 of 30 min: keep 2 parts, then stop. $73 after labour.'
		);
		expect(planSaid(usual(5, 0), say)).toBe('Nothing pays in these minutes.');
	});

	it('counts the minutes of the shop, and what is logged no more', () => {
		const there = subjectsOn(5);
		const less = there.filter((one) => one.kind !== 'starter12');
		expect(ids(planOf(less, DEFAULT_POLICY, 'normal', 30).order)).not.toContain('starter12');
		const slow = { ...DEFAULT_POLICY, kinds: { starter12: { pullMinutes: 300 } } };
		expect(ids(plan(5, 60, slow).order)).not.toContain('starter12');
	});

	it('shows what only stands in the way, with what it opens', () => {
		const steps = usual(1, 30).order;
		const way = steps.find(({ keep }) => !keep)!;
		expect(way).toMatchObject({ id: 'airfilter', opens: [kind('airbox').name], givenUpFor: [] });
		expect(stepSaid(way)).toBe(`Only in the way of ${kind('airbox').name}`);
	});

	it('shows what is given up for another: the pieces of a whole that comes off for its own', () => {
		const pieces = subjectsOn(4).map((one) => {
			const wanted = one.kind === 'carb-float' || one.kind === 'fuel-sol';
			const newCents = one.kind === 'fuel-sol' ? 60_000 : 20_000;
			const price = { newCents, copyCents: null, source: '', seenOn: '2026-03-03', stale: false };
			return wanted ? { ...one, price } : one;
		});
		const { order } = planOf(pieces, DEFAULT_POLICY, 'normal');
		const carburetor = order.find(({ id }) => id === 'carb-float')!;
		expect(carburetor).toMatchObject({ keep: false, givenUpFor: [kind('fuel-sol').name] });
		expect(stepSaid(carburetor)).toBe(`Given up for ${kind('fuel-sol').name}`);
	});
});

describe('what is sacrificed', () => {
	const priced = (kindId: string, newCents: number) => {
		const price = { newCents, copyCents: null, source: '', seenOn: '2026-03-03', stale: false };
		return { ...subjectsOn(7)[0]!, kind: kindId, grade: 'untested' as const, price };
	};
	const steps = (augerCents: number, chuteCents: number) =>
		planOf([priced('auger', augerCents), priced('chute', chuteCents)], DEFAULT_POLICY, 'slow');

	it('is shown as such where the part that spoils it is worth more', () => {
		const { order, below } = steps(90_000, 60_000);
		expect(ids(order)).toEqual(['auger']);
		expect(below).toMatchObject([{ id: 'chute', sacrificedFor: [kind('auger').name] }]);
		expect(belowSaid(below[0]!, say)).toBe(`Sacrificed for ${kind('auger').name}`);
	});

	it('is kept where it is worth more, and what would spoil it says so', () => {
		const { order, below } = steps(20_000, 90_000);
		expect(ids(order)).toEqual(['chute']);
		expect(below).toMatchObject([{ id: 'auger', sacrificedFor: [], spoils: [kind('chute').name] }]);
		expect(belowSaid(below[0]!, say)).toMatch(/would cost .+, spoils Chute/);
	});
});

describe('what has no price', () => {
	it('counts roughly, at the middle of its kind, and is marked', () => {
		const bare = subjectsOn(4).find((one) => one.price === null && one.kind === 'eclutch')!;
		const part = planPart(bare, DEFAULT_POLICY, 'normal');
		const { newLowCents, newHighCents } = kind('eclutch');
		const gainAt = (newCents: number) => {
			const price = { newCents, copyCents: null, source: '', seenOn: '2026-03-03', stale: false };
			return verdictOf({ ...bare, stillOn: false, price }, DEFAULT_POLICY, 'normal').gainCents!;
		};
		expect(part.rough).toBe(true);
		expect(part.gainCents).toBeGreaterThan(gainAt(newLowCents));
		expect(part.gainCents).toBeLessThan(gainAt(newHighCents));
		const step = usual(4, 30).order.find(({ id }) => id === 'eclutch')!;
		expect(step.rough).toBe(true);
		expect(stepSaid(step)).toContain('no price yet');
	});

	it('is not looked for on a bare engine where only the machine has it', () => {
		const kinds = (donor: number) => subjectsOn(donor).map(({ kind }) => kind);
		expect(kinds(4)).not.toContain('hydro');
		expect(kinds(8)).toContain('sawclutch');
		const dear = { newCents: 90_000, copyCents: null, source: '', seenOn: '', stale: false };
		const hydro = { ...subjectsOn(4)[0]!, kind: 'hydro' };
		expect(plannable([{ ...hydro, price: dear }], 'R1')).toHaveLength(1);
		expect(plannable([{ ...hydro, price: null }], 'R1')).toHaveLength(0);
	});
});

it('minutes stand along it at round figures', () => {
	expect(ticksTo(28)).toEqual([0, 5, 10, 15, 20]);
	expect(ticksTo(120)).toEqual([0, 30, 60, 90]);
	expect(ticksTo(4)).toEqual([0]);
	expect(ticksTo(1000).length).toBeLessThan(8);
});

it('what can never be stock is neither kept nor listed below the line', () => {
	for (const donor of DONORS) {
		const { order, below } = usual(donor);
		const kept = [...order.filter(({ keep }) => keep), ...below];
		expect(kept.filter(({ id }) => kind(id).reuse === 'never')).toEqual([]);
	}
});

it('says what one more would take and bring', () => {
	const { below, order } = usual(5, 30);
	const wanted = below.find(({ totalCents }) => totalCents > 0)!;
	expect(belowSaid(wanted, say)).toMatch(/^\d+ more min, would bring \$\d+/);
	const loss = below.find(({ totalCents, goesWith }) => totalCents < -100 && !goesWith)!;
	expect(belowSaid(loss, say)).toContain('would cost $');
	const whole = order.find(({ id, keep }) => keep && id === 'starter12')!;
	const piece = below.find(({ id }) => id === 'drive')!;
	expect(belowSaid(piece, say)).toBe(`Stays with: ${whole.kindName}`);
});
