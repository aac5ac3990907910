import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pullPlan, type PullInput, type PullPart } from './index';

const NAMES = 'abcdefghij';

/** Donors of up to ten parts, with wholes, what ruins what, and here and there a ring. */
function donors(size: number): fc.Arbitrary<PullInput> {
	const among = (count: number) => fc.uniqueArray(fc.nat(count - 1), { maxLength: 2 });
	const part = (at: number, count: number): fc.Arbitrary<PullPart> =>
		fc
			.record({
				behind: among(Math.max(1, at)),
				ring: fc.option(fc.nat(count - 1), { freq: 12 }),
				partOf: fc.option(fc.nat(count - 1), { freq: 4 }),
				ruins: fc.option(fc.nat(count - 1), { freq: 6 }),
				minutes: fc.integer({ min: 0, max: 24 }),
				keepMinutes: fc.option(fc.integer({ min: 0, max: 6 })),
				gainCents: fc.integer({ min: -500, max: 4000 })
			})
			.map((drawn) => ({
				id: NAMES[at]!,
				behind: [...drawn.behind, ...(drawn.ring === null ? [] : [drawn.ring])].map(
					(each) => NAMES[each]!
				),
				partOf: drawn.partOf === null ? null : NAMES[drawn.partOf]!,
				ruins: drawn.ruins === null ? [] : [NAMES[drawn.ruins]!],
				minutes: drawn.minutes / 2,
				keepMinutes: drawn.keepMinutes,
				gainCents: drawn.gainCents
			}));
	return fc.integer({ min: 1, max: size }).chain((count) =>
		fc.record({
			parts: fc.tuple(...Array.from({ length: count }, (_each, at) => part(at, count))),
			minutes: fc.option(fc.integer({ min: 0, max: 60 })),
			labourNow: fc.integer({ min: 0, max: 130 })
		})
	);
}

/** What must be off before each, by the words of the rule and by walking. */
function before({ parts }: PullInput): Map<string, Set<string>> {
	const present = new Set(parts.map(({ id }) => id));
	const walk = (steps: Map<string, string[]>, id: string) => {
		const seen = new Set([id]);
		for (const each of seen) for (const next of steps.get(each) ?? []) seen.add(next);
		return seen;
	};
	const behind = new Map(
		parts.map(({ id, behind }) => [id, (behind ?? []).filter((each) => present.has(each))])
	);
	const all = new Map(
		parts.map(({ id, partOf }) => {
			const waits = partOf && present.has(partOf) && !walk(behind, partOf).has(id);
			return [id, [...behind.get(id)!, ...(waits ? [partOf] : [])]];
		})
	);
	return new Map(parts.map(({ id }) => [id, walk(all, id)]));
}

function fits(off: Set<string>, kept: Set<string>, { parts }: PullInput): boolean {
	const byId = new Map(parts.map((part) => [part.id, part]));
	for (const id of kept) {
		const seen = new Set([id]);
		for (const each of seen) {
			const whole = byId.get(each)?.partOf;
			if (whole && byId.has(whole)) seen.add(whole);
		}
		seen.delete(id);
		if ([...seen].some((whole) => kept.has(whole))) return false;
	}
	return [...off].every((id) =>
		byId.get(id)!.ruins!.every((each) => each === id || !kept.has(each))
	);
}

function sums(off: Set<string>, kept: Set<string>, { parts, labourNow }: PullInput) {
	let minutes = 0;
	let gains = 0;
	for (const part of parts) {
		if (off.has(part.id)) minutes += part.minutes;
		if (kept.has(part.id)) minutes += part.keepMinutes ?? 0;
		if (kept.has(part.id)) gains += part.gainCents;
	}
	return { minutes, cents: gains - labourNow * minutes };
}

function bruteForce(input: PullInput) {
	const needs = before(input);
	const limit = input.minutes ?? Infinity;
	let best = { minutes: 0, cents: 0 };
	for (let mask = 1; mask < 1 << input.parts.length; mask += 1) {
		const kept = new Set(input.parts.filter((_part, at) => mask & (1 << at)).map(({ id }) => id));
		const off = new Set([...kept].flatMap((id) => [...needs.get(id)!]));
		const sum = sums(off, kept, input);
		if (sum.minutes > limit || !fits(off, kept, input)) continue;
		const same = Math.abs(sum.cents - best.cents) < 1e-6;
		if (same ? sum.minutes < best.minutes : sum.cents > best.cents) best = sum;
	}
	return best;
}

const setsOf = ({ order }: ReturnType<typeof pullPlan>) => ({
	off: new Set(order.map(({ id }) => id)),
	kept: new Set(order.filter(({ keep }) => keep).map(({ id }) => id))
});

describe('a pull plan', () => {
	it('equals brute force: the total, and of equal totals the fewest minutes', () => {
		fc.assert(
			fc.property(donors(9), (input) => {
				const plan = pullPlan(input);
				const best = bruteForce(input);
				expect(plan.totalCents).toBe(Math.round(best.cents));
				expect(plan.minutes).toBeCloseTo(best.minutes, 9);
			}),
			{ numRuns: 160 }
		);
	});

	it('is closed, keeps no piece with its whole, stays in the minutes and adds up', () => {
		fc.assert(
			fc.property(donors(10), (input) => {
				const plan = pullPlan(input);
				const { off, kept } = setsOf(plan);
				const needs = before(input);
				for (const id of off) for (const each of needs.get(id)!) expect(off).toContain(each);
				expect(fits(off, kept, input)).toBe(true);
				expect(plan.minutes).toBeLessThanOrEqual((input.minutes ?? Infinity) + 1e-9);
				const sum = sums(off, kept, input);
				expect([plan.minutes, plan.totalCents]).toEqual([sum.minutes, Math.round(sum.cents) || 0]);
				const last = plan.order.at(-1);
				expect(last?.runningMinutes ?? 0).toBeCloseTo(sum.minutes, 9);
				expect(last?.runningCents ?? 0).toBe(plan.totalCents);
				expect(plan.order.length + plan.below.length).toBe(input.parts.length);
			}),
			{ numRuns: 150 }
		);
	});

	it('takes nothing off before what stands before it', () => {
		fc.assert(
			fc.property(donors(10), (input) => {
				const needs = before(input);
				const done = new Set<string>();
				for (const { id } of pullPlan(input).order) {
					for (const each of needs.get(id)!) {
						const ring = needs.get(each)!.has(id);
						if (!ring) expect(done).toContain(each);
					}
					done.add(id);
				}
			}),
			{ numRuns: 120 }
		);
	});

	it('never brings less with more minutes', () => {
		fc.assert(
			fc.property(donors(10), fc.integer({ min: 0, max: 30 }), (input, more) => {
				const minutes = input.minutes ?? 20;
				const few = pullPlan({ ...input, minutes }).totalCents;
				expect(pullPlan({ ...input, minutes: minutes + more }).totalCents).toBeGreaterThanOrEqual(
					few
				);
				expect(pullPlan({ ...input, minutes: null }).totalCents).toBeGreaterThanOrEqual(few);
			}),
			{ numRuns: 120 }
		);
	});
});
