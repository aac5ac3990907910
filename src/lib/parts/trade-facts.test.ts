import { describe, expect, it } from 'vitest';
import { DEFAULT_POLICY } from '$lib/people/policy';
import { chanceLevel, kind, kinds, kindsOn, type CauseId } from '$lib/trade';
import { gain, keepCleaning, pullPlan, verdictWord, type PullPart } from '$lib/worth';
import { verdictOf } from './verdict';
import { gainInput, priceAt, pricedGrade, chanceOf } from './verdict-inputs';
import type { VerdictSubject } from './verdict-view';

const lone: VerdictSubject = {
	...{ kind: 'carb-float', grade: 'untested', cause: null, secondCause: null, sureness: 'seen' },
	...{ proofs: [], place: 1, have: 0, price: null, massGrams: null, litres: null, bin: null },
	...{ stillOn: true, family: 'some', waiting: false }
};
const priced = (newCents: number, copyCents: number | null) => ({
	...{ newCents, copyCents, source: 'list', seenOn: '2026-11-30', stale: false }
});

/** A donor as the plan sees it: the middle of each kind's price band, no copies. */
function donor(ids: readonly string[], cause: CauseId): PullPart[] {
	return ids.map((id) => {
		const { newLowCents, newHighCents, pullMinutes, behind, partOf, reuse } = kind(id);
		const price = priced((newLowCents + newHighCents) / 2, null);
		const subject = { ...lone, kind: id, cause, price, stillOn: false };
		const chance = chanceOf(subject, DEFAULT_POLICY);
		const grade = pricedGrade(subject, chance.level);
		const { usedCents } = priceAt(grade, price, DEFAULT_POLICY);
		const { gainCents } = gain(gainInput(subject, DEFAULT_POLICY, 'normal', usedCents));
		const never = chance.ruined || reuse === 'never';
		const minutes = { minutes: pullMinutes, keepMinutes: DEFAULT_POLICY.keepMinutes };
		return { id, behind, partOf, ...minutes, gainCents: never ? 0 : gainCents };
	});
}
const labourNow = DEFAULT_POLICY.labourHourCents.normal / 60;

// common practice, no source
describe('facts of the trade', () => {
	it('an engine that ran without oil: bottom end gone, what hangs on it probably good', () => {
		const oil: CauseId = 'no-oil';
		for (const id of ['rod', 'piston', 'block'])
			expect(['ruined', 'low']).toContain(chanceLevel(id, oil));
		for (const id of ['carb-float', 'fuel-tank', 'starter120', 'coil', 'shroud'])
			expect(chanceLevel(id, oil)).toBe('high');
		const ids = kindsOn('R1', ['12 V start', 'charging', 'recoil']).map(({ id }) => id);
		const { order } = pullPlan({ parts: donor(ids, oil), labourNow });
		const kept = order.filter(({ keep }) => keep).map(({ id }) => id);
		expect(kept).toEqual(expect.arrayContaining(['carb-float', 'starter12', 'coil']));
		for (const id of ['rod', 'piston', 'block', 'crank']) expect(kept).not.toContain(id);
	});

	it('a dear carburetor of a snow thrower without a copy is kept, one with a cheap copy is not', () => {
		const snow = { ...lone, cause: 'stale-fuel' as CauseId, stillOn: false };
		const proofs = [{ how: 'bench test cold' as const, passed: true }];
		const tested = { ...snow, grade: 'good used' as const, proofs };
		const at = (newCents: number, copyCents: number | null) =>
			verdictOf({ ...tested, price: priced(newCents, copyCents) }, DEFAULT_POLICY, 'normal');
		expect(at(12_000, null).verdict).toBe('keep');
		expect(at(5800, 1900).verdict).not.toBe('keep');
	});

	it('a carburetor is given up after three or four cleanings, sooner with posted labour', () => {
		const gummed = { alpha: 2.4, beta: 1.6, failures: 0, worthCents: 5200 };
		const { cleanMinutes, testMinutes } = kind('carb-float');
		const stop = (hour: number) =>
			keepCleaning({ ...gummed, attemptCents: ((cleanMinutes + testMinutes) * hour) / 60 })
				.stopAfter;
		expect([3, 4]).toContain(stop(DEFAULT_POLICY.labourHourCents.normal));
		expect(stop(DEFAULT_POLICY.labourHourCents.rush)).toBeLessThan(3);
		expect(keepCleaning({ ...gummed, attemptCents: 2200 }).stopAfter).toBe(2);
	});

	it('belts, rings, gaskets and rod bolts are never kept', () => {
		for (const id of ['belt', 'rings', 'exgasket', 'hgasket']) expect(kind(id).reuse).toBe('never');
		expect(kind('rod').reason + kind('rod').howTested).toMatch(/bolt/i);
	});

	it('a gain of nothing is let go, whatever was paid for the donor', () => {
		expect(verdictWord({ gainCents: 0, marginCents: DEFAULT_POLICY.marginCents })).toBe(
			'let it go'
		);
	});
});

describe('the plan of a real donor', () => {
	const sixty = kinds.filter(({ on }) => on.includes('R1')).slice(0, 60);

	it('of sixty parts and 240 minutes is there within 100 ms', () => {
		const parts = donor(
			sixty.map(({ id }) => id),
			'stale-fuel'
		);
		expect(parts).toHaveLength(60);
		const times = [15, 30, 60, 120, 240, 240, 240].map((minutes) => {
			const start = performance.now();
			const { minutes: spent } = pullPlan({ parts, minutes, labourNow });
			expect(spent).toBeLessThanOrEqual(minutes + 1e-9);
			return performance.now() - start;
		});
		expect(Math.min(...times.slice(-3))).toBeLessThan(100);
	});

	it('more minutes never bring less', () => {
		const parts = donor(
			sixty.map(({ id }) => id),
			'stale-fuel'
		);
		let before = 0;
		for (let minutes = 0; minutes <= 240; minutes += 20) {
			const { totalCents } = pullPlan({ parts, minutes, labourNow });
			expect(totalCents).toBeGreaterThanOrEqual(before);
			before = totalCents;
		}
	});
});
