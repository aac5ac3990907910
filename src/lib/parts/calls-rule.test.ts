import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { callsRule, type CallsRow } from './calls-rule';

const belief = {
	usual: (kind: string) => (kind === 'never' ? 0 : kind === 'coil' ? 0.98 : 0.4),
	mark: (engine: string) => (engine === 'many' ? 3 : 1),
	worth: 10
};
const row = (kind: string, engine: string, calls: number, years: number): CallsRow => ({
	...{ kind, engine },
	...{ calls, years }
});
const rule = (...rows: CallsRow[]) => callsRule(rows, belief);

const rows = fc.uniqueArray(
	fc.record({
		kind: fc.constantFrom('coil', 'crank', 'starter', 'never'),
		engine: fc.constantFrom('a', 'b', 'many', ''),
		calls: fc.integer({ min: 0, max: 40 }),
		years: fc.double({ min: 0, max: 30, noNaN: true })
	}),
	{ selector: ({ kind, engine }) => `${kind} ${engine}`, maxLength: 16 }
);

describe('calls by the steps of what was seen', () => {
	it('are the usual ones to the letter where nothing was', () => {
		expect(rule()('coil', 'a', 1).mean).toBe(0.98);
		expect(rule()('coil', 'many', 3).mean).toBe(0.98 * 3);
	});

	it('tell by all other kinds how busy the shop is', () => {
		const steps = rule(row('crank', 'b', 12, 10))('coil', 'a', 1);
		expect(steps.shop).toMatchObject({ calls: 12, years: 4 });
		expect(steps.mean).toBeCloseTo((0.98 * (10 + 12)) / (10 + 4), 12);
	});

	it('tell by its other kinds how many of an engine are about', () => {
		const shop = (10 + 12) / (10 + 4);
		const steps = rule(row('crank', 'a', 12, 10))('coil', 'a', 1);
		expect(steps.engine).toMatchObject({ calls: 12, years: 10 * 0.4 });
		expect(steps.mean).toBeCloseTo(0.98 * shop * ((10 + 12) / (10 + 4)), 12);
	});

	it('count a part itself once: at the last step', () => {
		const steps = rule(row('coil', 'a', 7, 3))('coil', 'a', 1);
		for (const { calls, years } of [steps.shop, steps.others, steps.engine])
			expect([calls, years]).toEqual([0, 0]);
		expect(steps.mean).toBeCloseTo((10 + 7) / (10 / 0.98 + 3), 12);
	});

	it('come of nothing but calls where nobody calls by the figures', () => {
		expect(rule(row('never', 'a', 0, 9))('never', 'a', 1).mean).toBe(0);
		expect(rule(row('never', 'a', 3, 5))('never', 'a', 1).mean).toBeCloseTo(3 / 15, 12);
	});

	it('few never swing them: n calls raise a step at most by n of the worth', () => {
		fc.assert(
			fc.property(rows, fc.constantFrom('coil', 'crank'), (seen, kind) => {
				const { shop, others, engine, own, believed, mean } = rule(...seen)(kind, 'a', 1);
				const most = (calls: number) => 1 + calls / belief.worth + 1e-9;
				expect(shop.times).toBeLessThanOrEqual(most(shop.calls));
				expect(others.mean).toBeLessThanOrEqual(others.believed * most(others.calls));
				expect(engine.times).toBeLessThanOrEqual(most(engine.calls));
				expect(mean).toBeLessThanOrEqual(believed * most(own.calls));
				expect(mean).toBeGreaterThan(0);
			})
		);
	});

	it('are not fewer for one call more, nor more for one year more without', () => {
		fc.assert(
			fc.property(rows, fc.nat(), (seen, place) => {
				const at = seen.length ? place % seen.length : -1;
				const with1 = (calls: number, years: number) =>
					rule(
						...seen.map((one, n) =>
							n === at ? { ...one, calls: one.calls + calls, years: one.years + years } : one
						)
					)('coil', 'a', 1).mean;
				const asked = seen[at]?.kind === 'coil' && seen[at].engine === 'a';
				if (!asked) return;
				expect(with1(1, 0)).toBeGreaterThan(with1(0, 0));
				expect(with1(0, 1)).toBeLessThan(with1(0, 0));
			}),
			{ numRuns: 500 }
		);
	});

	it('do not depend on the order of what was seen', () => {
		fc.assert(
			fc.property(rows, (seen) => {
				const mean = rule(...seen)('coil', 'a', 1).mean;
				expect(rule(...[...seen].reverse())('coil', 'a', 1).mean / mean).toBeCloseTo(1, 9);
			})
		);
	});
});
