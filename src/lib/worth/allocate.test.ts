import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { allocate, carry, gain, WorthError, type Allocation, type PartToCost } from './index';

const split = (method: Allocation['method'], joint: number, parts: Omit<PartToCost, 'id'>[]) =>
	allocate({
		jointCents: joint * 100,
		byProductCents: 0,
		method,
		parts: parts.map((part, at) => ({ id: `${at}`, ...part }))
	}).shares.map(({ cents }) => cents / 100);
const asked = (final: number, own = 0) => ({ askedCents: final * 100, ownCostCents: own * 100 });
const sold = (cents: number) => ({ splitOffCents: cents * 100 });
const mass = (grams: number) => ({ grams });

describe('joint cost, against published examples', () => {
	// Horngren, Datar and Rajan, Cost Accounting, joint costs, raw milk; values from memory
	it('cream and skim', () => {
		expect(split('physical', 400_000, [mass(25_000), mass(75_000)])).toEqual([100_000, 300_000]);
		expect(split('split-off', 400_000, [sold(200_000), sold(300_000)])).toEqual([160_000, 240_000]);
		expect(split('nrv', 400_000, [asked(500_000, 280_000), asked(1_100_000, 520_000)])).toEqual([
			110_000, 290_000
		]);
	});

	// university lecture slides on joint cost, cream and skim; lesson on net realisable value
	it('lecture and lesson', () => {
		expect(split('nrv', 500, [asked(1300, 900), asked(800, 200)])).toEqual([200, 300]);
		expect(split('nrv', 150_000, [asked(200_000, 40_000), asked(150_000, 25_000)])).toEqual([
			84_210.53, 65_789.47
		]);
	});

	// OpenStax 2019, Principles of Managerial Accounting, section 10.5; answers worked out
	it('Calcion, Laramie and Strawberry', () => {
		expect(split('physical', 36_000, [mass(25), mass(75)])).toEqual([9000, 27_000]);
		expect(split('split-off', 36_000, [sold(25 * 150), sold(75 * 125)])).toEqual([
			10_285.71, 25_714.29
		]);
		expect(split('physical', 66_000, [mass(44), mass(66)])).toEqual([26_400, 39_600]);
		expect(split('split-off', 66_000, [sold(44 * 250), sold(66 * 295)])).toEqual([
			23_826.71, 42_173.29
		]);
		expect(split('physical', 40_000, [mass(42_000), mass(4000)])).toEqual([36_521.74, 3478.26]);
		expect(split('split-off', 40_000, [sold(104_500), sold(50_500)])).toEqual([
			26_967.74, 13_032.26
		]);
		const strawberry = [asked(125_000, 8000), asked(70_000, 40_000)];
		expect(split('nrv', 40_000, strawberry)).toEqual([31_836.73, 8163.27]);
	});

	it('gives nobody a negative share, where an even margin would', () => {
		const margin = (125_000 + 70_000 - 48_000 - 40_000) / 195_000;
		expect(70_000 * (1 - margin) - 40_000).toBeCloseTo(-8410.26, 2);
		const shares = split('nrv', 40_000, [asked(125_000, 8000), asked(70_000, 75_000)]);
		expect(shares).toEqual([40_000, 0]);
	});

	// the same, a part given away: when the other stops selling, the whole cost lands on what is left
	it('a part given away bears nothing', () => {
		expect(split('nrv', 1_100_000, [asked(1_000_000), asked(100_000)])).toEqual([
			1_000_000, 100_000
		]);
		expect(split('nrv', 1_100_000, [asked(1_000_000), asked(0)])).toEqual([1_100_000, 0]);
	});

	// lesson on by-products: 8,000 less 500 of selling leaves 92,500 to spread
	it('the by-product comes off first', () => {
		const parts = [{ id: 'a', askedCents: 100 }];
		const input = {
			jointCents: 10_000_000,
			byProductCents: 750_000,
			parts,
			method: 'nrv' as const
		};
		expect(allocate(input).shares[0]?.cents).toBe(9_250_000);
		expect(allocate({ ...input, byProductCents: 10_000_900 })).toEqual({
			...{ shares: [{ id: 'a', cents: 0 }], lossCents: 0, incomeCents: 900 }
		});
	});
});

describe('shares', () => {
	const part = fc.record({
		askedCents: fc.integer({ min: 0, max: 90_000 }),
		ownCostCents: fc.integer({ min: 0, max: 30_000 }),
		splitOffCents: fc.integer({ min: 0, max: 90_000 }),
		grams: fc.double({ min: 0, max: 90_000, noNaN: true })
	});
	const inputs: fc.Arbitrary<Allocation> = fc.record({
		jointCents: fc.oneof(fc.nat(100_000), fc.nat(1_000_000_000_000)),
		byProductCents: fc.nat(20_000),
		method: fc.constantFrom('nrv' as const, 'split-off' as const, 'physical' as const),
		parts: fc
			.array(part, { maxLength: 40 })
			.map((parts) => parts.map((each, at) => ({ id: `${at}`, ...each })))
	});

	it('add up to the cent, none negative, none for what has no value', () => {
		fc.assert(
			fc.property(inputs, (input) => {
				const { shares, lossCents, incomeCents } = allocate(input);
				const sum = shares.reduce((all, { cents }) => all + cents, lossCents - incomeCents);
				expect(sum).toBe(input.jointCents - input.byProductCents);
				for (const [at, { cents }] of shares.entries()) {
					expect(Number.isInteger(cents) && cents >= 0).toBe(true);
					const { askedCents, ownCostCents } = input.parts[at]!;
					if (input.method === 'nrv' && askedCents! <= ownCostCents!) expect(cents).toBe(0);
				}
			})
		);
	});

	it('lie within a cent of their exact part', () => {
		fc.assert(
			fc.property(inputs, (input) => {
				const total = input.parts.reduce((sum, { grams }) => sum + grams!, 0);
				fc.pre(total > 1e-9 && input.jointCents < 1e9);
				const left = Math.max(0, input.jointCents - input.byProductCents);
				allocate({ ...input, method: 'physical' }).shares.forEach(({ cents }, at) =>
					expect(Math.abs(cents - (left * input.parts[at]!.grams!) / total)).toBeLessThan(1 + 1e-6)
				);
			})
		);
	});

	it('stay on the donor as a loss where nothing has a value', () => {
		const none = { jointCents: 5000, byProductCents: 700, method: 'nrv' as const, parts: [] };
		expect(allocate(none)).toEqual({ shares: [], lossCents: 4300, incomeCents: 0 });
		const parts = [{ id: 'a', askedCents: 900, ownCostCents: 900 }];
		expect(allocate({ ...none, parts })).toMatchObject({
			...{ shares: [{ id: 'a', cents: 0 }], lossCents: 4300 }
		});
	});

	it.each([
		[{ jointCents: 10.5 }, 'jointCents'],
		[{ byProductCents: -1 }, 'byProductCents'],
		[{ method: 'even' }, 'method'],
		[{ method: 'physical' }, 'parts[0].grams'],
		[{ parts: [{ id: 'a' }] }, 'parts[0].askedCents'],
		[{ parts: [{ askedCents: 1 }] }, 'parts[0].id'],
		[{ parts: null }, 'parts']
	])('refuses %j by name', (wrong, field) => {
		const good = {
			jointCents: 1,
			byProductCents: 0,
			parts: [{ id: 'a', askedCents: 1 }],
			method: 'nrv'
		};
		const bad = { ...good, ...wrong } as Allocation;
		expect(() => allocate(bad)).toThrow(WorthError);
		expect(() => allocate(bad)).toThrow(expect.objectContaining({ field }));
	});
});

describe('what a part stands in the books at', () => {
	const at = (cost: number, net: number, count = 1) =>
		(carry({ costCents: cost * 100, netRealisableCents: net * 100 }).carriedCents / 100) * count;

	// OpenStax 2019, Principles of Financial Accounting, section 10.1, exercises A and B; worked out
	it('is the lower one, item by item, never pooled', () => {
		expect(at(36, 35, 10) + at(20, 20, 25) + at(6, 8, 12)).toBe(922);
		expect(Math.min(932, 946)).not.toBe(922);
		expect(at(100, 95, 20) + at(75, 70, 30) + at(50, 55, 45)).toBe(6250);
	});

	// Lumen Learning, Financial Accounting: 100 speakers; CPA-style item of 100,000
	it('writes down to what it nets', () => {
		const speaker = carry({ costCents: 11_000, netRealisableCents: 7000 - 2000 });
		expect(speaker).toEqual({ carriedCents: 5000, writeDownCents: 6000 });
		expect(carry({ costCents: 10_000_000, netRealisableCents: 9_000_000 })).toEqual({
			...{ carriedCents: 9_000_000, writeDownCents: 1_000_000 }
		});
	});

	// IAS 2, paragraphs 28 to 33: a reversal goes up to the cost and no further
	it('recovers to its cost at most, and is never carried below nil', () => {
		expect([at(40, 25), at(40, 38), at(40, 90)]).toEqual([25, 38, 40]);
		expect(carry({ costCents: 4000, netRealisableCents: -500 })).toEqual({
			...{ carriedCents: 0, writeDownCents: 4000 }
		});
		expect(() => carry({ costCents: -1, netRealisableCents: 0 })).toThrow(WorthError);
	});
});

// OpenStax 2019, Principles of Managerial Accounting, section 10.5: sell or process further
describe('a joint cost is sunk', () => {
	it('only what differs counts: 900,000 against 1,130,000, 160,000 against 90,000', () => {
		const leather = [400_000 * 2.25, 100_000 * (15 - 2.85) - 85_000];
		const apples = [200_000 * (1.1 - 0.3), 100_000 * (3.5 - 0.6) - 200_000];
		expect([...leather, ...apples].map(Math.round)).toEqual([900_000, 1_130_000, 160_000, 90_000]);
	});

	it('no figure of the gain knows what was paid for the donor', () => {
		const part = {
			...{ usedCents: 4600, chanceGood: 0.6, comeBack: 0.08, comeBackCents: 3900 },
			...{ callsPerYear: 1.5, place: 1, moneyRate: 0.1, dyingRate: 0.1, shelfCents: 150 },
			...{ scrapCents: 20, labourNow: 57, labour: 57, minutesNow: 9, minutesLater: 14 }
		};
		fc.assert(
			fc.property(fc.nat(1_000_000), (jointCents) => {
				expect(gain({ ...part, ...{ jointCents } })).toEqual(gain(part));
			}),
			{ numRuns: 20 }
		);
	});
});
