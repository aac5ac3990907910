import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleaningOf, cleaningSaid, type CleaningFacts } from './cleaning';

const FACTS: CleaningFacts = {
	...{ chance: 0.6, weight: 4, attempts: 0, failures: 0 },
	...{ askedCents: 5200, scrapCents: 0, minutes: 33, labourHourCents: 4000 }
};
const say = (cents: number) => `$${(cents / 100).toFixed(2)}`;

describe('when to stop cleaning', () => {
	// alpha 2.4, beta 1.6, worth 52, an attempt 22: worth it twice, then not
	it('goes on while the next attempt leaves something in hand', () => {
		const hand = [0, 1, 2].map(
			(failures) => cleaningOf({ ...FACTS, failures }).advice?.inHandCents
		);
		expect(hand).toEqual([920, 296, -120]);
		expect(cleaningOf(FACTS).advice).toMatchObject({ go: true, stopAfter: 2 });
		expect(cleaningOf({ ...FACTS, failures: 2 }).advice).toMatchObject({ go: false });
	});
	it('never gets keener with another failure, and says nothing without a price', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 0, max: 1, noNaN: true }),
				fc.nat(20),
				fc.nat(100_000),
				(chance, failures, askedCents) => {
					const at = (more: number) =>
						cleaningOf({ ...FACTS, chance, askedCents, failures: failures + more }).advice!;
					expect(at(1).inHandCents).toBeLessThanOrEqual(at(0).inHandCents);
					if (at(1).go) expect(at(0).go).toBe(true);
				}
			)
		);
		expect(cleaningOf({ ...FACTS, askedCents: null }).advice).toBeNull();
	});
	it('is said in money', () => {
		expect(cleaningSaid(cleaningOf(FACTS), say)).toBe(
			'One more costs $22.00 of minutes and leaves $9.20 in hand, on average.'
		);
		expect(cleaningSaid(cleaningOf({ ...FACTS, failures: 2, attempts: 2 }), say)).toBe(
			'Stop: one more costs $22.00 of minutes and loses $1.20, on average. Fit another.'
		);
		expect(cleaningSaid(cleaningOf({ ...FACTS, askedCents: null }), say)).toMatch(/With a price/);
		expect(cleaningSaid(cleaningOf({ ...FACTS, askedCents: 100 }), say)).toMatch(/does not pay/);
	});
});
