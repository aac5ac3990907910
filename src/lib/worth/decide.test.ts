import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decide, WorthError, type DecisionInput } from './index';

/** Common practice, no source: a dead engine of the 20-hp class, rod through the block. */
const big: DecisionInput = {
	...{ fixChance: 0.75, fixedPriceCents: 65_000, fixReach: 0.8, newPartsCents: 24_000 },
	...{ labourCents: 27_000, parkCents: 21_000, yardCents: 15_000, stripTotalCents: 31_000 },
	...{ wholePriceCents: 9000, wholeReach: 0.7, handlingCents: 1200 },
	...{ scrapAllCents: 900, disposalCents: 200 }
};
/** The same for an ordinary walk-behind whose parts all meet a cheap copy. */
const small: DecisionInput = {
	...{ fixChance: 0.9, fixedPriceCents: 16_000, fixReach: 0.85, newPartsCents: 2200 },
	...{ labourCents: 5100, parkCents: 1500, yardCents: 8000, stripTotalCents: 1900 },
	...{ wholePriceCents: 2500, wholeReach: 0.8, handlingCents: 600 },
	...{ scrapAllCents: 400, disposalCents: 200 }
};

describe('the five choices', () => {
	it('a big dead engine is worth more in parts than repaired or whole', () => {
		expect(decide(big).choices).toEqual([
			{ choice: 'strip', cents: 31_700 },
			{ choice: 'park', cents: 6900 },
			{ choice: 'whole', cents: 5100 },
			{ choice: 'scrap', cents: 700 },
			{ choice: 'fix', cents: 39_000 + 225 - 51_000 }
		]);
	});

	it('an ordinary walk-behind with a cheap copy is not', () => {
		expect(decide(small).choices[0]).toEqual({ choice: 'fix', cents: 12_240 + 40 - 7300 });
		const beyond = decide({ ...small, fixChance: 0.1, stripTotalCents: 0 });
		expect(beyond.choices.map(({ choice }) => choice).slice(0, 2)).toEqual(['whole', 'scrap']);
	});

	it('says what the repair would have to cost', () => {
		const tip = decide(big).tips.find(({ input }) => input === 'labourCents');
		expect(tip).toBeUndefined();
		const fixable = decide({ ...big, newPartsCents: 2000 });
		expect(fixable.tips.find(({ input }) => input === 'labourCents')).toEqual({
			...{ input: 'labourCents', at: 39_225 - 2000 - 31_700, choice: 'fix', when: 'below' }
		});
	});

	it('of equal ones the less trouble is first', () => {
		const nothing = Object.fromEntries(Object.keys(big).map((field) => [field, 0]));
		expect(decide(nothing as unknown as DecisionInput).choices.map(({ choice }) => choice)).toEqual(
			[...['scrap', 'whole', 'park', 'strip', 'fix']]
		);
	});
});

describe('what tips it', () => {
	const cents = fc.integer({ min: 0, max: 80_000 });
	const share = fc.double({ min: 0, max: 1, noNaN: true });
	const donors: fc.Arbitrary<DecisionInput> = fc.record({
		...{ fixChance: share, fixedPriceCents: cents, fixReach: share, newPartsCents: cents },
		...{ labourCents: cents, parkCents: cents, yardCents: cents, stripTotalCents: cents },
		...{ wholePriceCents: cents, wholeReach: share, handlingCents: cents },
		...{ scrapAllCents: cents, disposalCents: cents }
	});
	const best = (donor: DecisionInput) => decide(donor).choices[0]!;
	const valueOf = (donor: DecisionInput, choice: string) =>
		decide(donor).choices.find((each) => each.choice === choice)!.cents;

	it('makes the other choice as good as the best, and better beyond', () => {
		fc.assert(
			fc.property(donors, (donor) => {
				const now = best(donor).choice;
				for (const { input, at, choice, when } of decide(donor).tips) {
					const there = { ...donor, [input]: at };
					expect(Math.abs(valueOf(there, choice) - valueOf(there, now))).toBeLessThanOrEqual(1);
					expect(best(there).cents - valueOf(there, choice)).toBeLessThanOrEqual(1);
					expect(when === 'above' ? at >= donor[input] : at <= donor[input]).toBe(true);
				}
			}),
			{ numRuns: 100 }
		);
	});

	it('is not to be had short of it, and nowhere where no tip is told', () => {
		fc.assert(
			fc.property(donors, share, (donor, part) => {
				const { tips } = decide(donor);
				for (const input of Object.keys(donor) as (keyof DecisionInput)[]) {
					const told = (when: string) =>
						tips.find((tip) => tip.input === input && tip.when === when);
					const most = donor[input] <= 1 && /Chance|Reach/.test(input) ? 1 : 1e6;
					const low = told('below')?.at ?? 0;
					const high = told('above')?.at ?? most;
					const between = { ...donor, [input]: low + part * (high - low) };
					expect(best(between).cents - valueOf(between, best(donor).choice)).toBeLessThanOrEqual(1);
				}
			}),
			{ numRuns: 60 }
		);
	});
});

it.each(Object.keys(big) as (keyof DecisionInput)[])('refuses a broken %s by name', (field) => {
	for (const bad of [-1, NaN, undefined]) {
		const donor = { ...big, [field]: bad } as DecisionInput;
		expect(() => decide(donor)).toThrow(WorthError);
		expect(() => decide(donor)).toThrow(expect.objectContaining({ field }));
	}
});
