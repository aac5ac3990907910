import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breakEven } from './break-even';
import { gainFigures } from './gain-input';
import { gain, type GainInput } from './index';

const within = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const cents = fc.integer({ min: 0, max: 50_000 });

const parts: fc.Arbitrary<GainInput> = fc.record({
	usedCents: cents,
	chanceGood: fc.oneof(fc.constant(0), within(0.01, 1)),
	comeBack: within(0, 0.9),
	comeBackCents: cents,
	kitCents: fc.integer({ min: 0, max: 3000 }),
	callsPerYear: fc.oneof(fc.constant(0), within(0.01, 20)),
	place: fc.integer({ min: 1, max: 40 }),
	moneyRate: fc.oneof(fc.constant(0), within(0.001, 0.5)),
	dyingRate: within(0.001, 1),
	shelfCents: fc.integer({ min: 0, max: 3000 }),
	scrapCents: fc.integer({ min: 0, max: 3000 }),
	labourNow: fc.integer({ min: 0, max: 200 }),
	labour: fc.integer({ min: 0, max: 200 }),
	minutesNow: fc.integer({ min: 0, max: 60 }),
	minutesLater: fc.integer({ min: 0, max: 60 }),
	waiting: fc.oneof(fc.constant(0), within(0, 1)),
	workWhenCalledOnly: fc.boolean()
});

const exact = (part: GainInput) => {
	const { terms } = gain(part);
	const now = part.workWhenCalledOnly ? -Infinity : terms.now;
	return Math.max(terms.whenCalled, now) - terms.scrap;
};
const atLeastNil = (part: GainInput) => Math.max(exact(part), 0);

const moves: [
	string,
	'rises' | 'falls',
	keyof GainInput,
	(part: GainInput, by: number) => number
][] = [
	['place', 'falls', 'place', (part, by) => part.place + 1 + Math.floor(by * 20)],
	['shelf cost', 'falls', 'shelfCents', (part, by) => part.shelfCents + by * 2000],
	['minutes now', 'falls', 'minutesNow', (part, by) => part.minutesNow + by * 60],
	['minutes later', 'falls', 'minutesLater', (part, by) => part.minutesLater + by * 60],
	['price', 'rises', 'usedCents', (part, by) => part.usedCents + by * 20_000],
	['chance', 'rises', 'chanceGood', (part, by) => part.chanceGood + by * (1 - part.chanceGood)],
	['calls', 'rises', 'callsPerYear', (part, by) => part.callsPerYear + by * 10]
];

describe('a gain above nil', () => {
	it.each(moves)('with more %s never moves but %s', (_said, way, field, more) => {
		fc.assert(
			fc.property(parts, within(0, 1), (part, by) => {
				const before = atLeastNil(part);
				const after = atLeastNil({ ...part, [field]: more(part, by) });
				if (way === 'falls') expect(after).toBeLessThanOrEqual(before + 1e-6);
				else expect(after).toBeGreaterThanOrEqual(before - 1e-6);
			})
		);
	});
});

describe('how many to keep', () => {
	it('is the last place at which keeping pays, wherever the part itself stands', () => {
		fc.assert(
			fc.property(parts, (part) => {
				const keep = gain(part).keepUpTo;
				if (keep === null) expect(exact({ ...part, place: 5000 })).toBeGreaterThan(-1e-6);
				else expect(exact({ ...part, place: keep + 1 })).toBeLessThanOrEqual(1e-6);
				if (keep) expect(exact({ ...part, place: keep })).toBeGreaterThan(0);
				expect(gain({ ...part, place: 1 }).keepUpTo).toBe(keep);
			})
		);
	});

	it('agrees with walking one place after the other', () => {
		fc.assert(
			fc.property(parts, (part) => {
				const keep = gain(part).keepUpTo;
				fc.pre(keep !== null && keep < 200);
				let walked = 0;
				while (exact({ ...part, place: walked + 1 }) > 1e-6) walked += 1;
				expect(walked).toBe(keep);
			})
		);
	});

	it('agrees with walking where nothing wears', () => {
		fc.assert(
			fc.property(parts, fc.integer({ min: 1, max: 3000 }), (part, shelfCents) => {
				const still = { ...part, moneyRate: 0, dyingRate: 0, shelfCents };
				fc.pre(still.callsPerYear > 0 && still.chanceGood > 0.01);
				const keep = gain(still).keepUpTo ?? 0;
				fc.pre(keep < 300);
				let walked = 0;
				while (exact({ ...still, place: walked + 1 }) > 1e-6) walked += 1;
				expect(walked).toBe(keep);
			})
		);
	});
});

describe('the break-even price', () => {
	it('makes the gain nil, timing by timing', () => {
		fc.assert(
			fc.property(parts, (part) => {
				const even = breakEven(gainFigures(part));
				fc.pre(even !== null && part.chanceGood > 0.01 && gain(part).terms.reach > 1e-6);
				if (!even) return;
				for (const timing of ['whenCalled', 'now'] as const) {
					fc.pre(even[timing] < 1e11);
					const { terms } = gain({ ...part, usedCents: even[timing] });
					expect(terms[timing] - terms.scrap).toBeCloseTo(0, 4);
				}
			})
		);
	});

	it('parts what pays from what does not', () => {
		fc.assert(
			fc.property(parts, (part) => {
				const price = gain(part).breakEvenUsedCents;
				fc.pre(price !== null && price < 1e9);
				if (price === null) return;
				expect(exact({ ...part, usedCents: price + 1 })).toBeGreaterThan(-1e-6);
				expect(exact({ ...part, usedCents: Math.max(0, price - 1) })).toBeLessThan(1e-6);
			})
		);
	});
});
