import { z } from 'zod';

const share = z.number().min(0).max(1);
const cents = z.number().int().min(0).max(100_000_000);
const yearly = z.number().min(0).lt(1);
const count = z.number().min(0).max(1000);
const weight = z.number().min(0.5).max(1000);

/** What the shop may set for one kind; what is absent is the kind's usual figure. */
export const KindFigures = z
	.object({
		callsPerYear: count,
		comeBack: share,
		kitCents: cents,
		pullMinutes: count,
		cleanMinutes: count,
		testMinutes: count,
		refitMinutes: count,
		massGrams: z.number().positive().max(200_000),
		size: z.enum(['s', 'm', 'l', 'xl'])
	})
	.partial();
export type KindFigures = z.infer<typeof KindFigures>;

const TestLimit = z.object({ least: z.number(), most: z.number() }).partial();

/** How many of an engine family are about; an ordinary one is not listed. */
export const FAMILY_FACTOR = { lots: 3, some: 1, hardly: 0.3 } as const;
export type FamilyMark = keyof typeof FAMILY_FACTOR;

export const Policy = z.object({
	/** Share of new that a used part of each grade fetches. */
	shares: z.object({
		'clean used': share,
		'good used': share,
		usable: share,
		untested: share,
		core: share
	}),
	/** A used part asks at most this share of an acceptable copy. */
	copyCap: share,
	/** Rounding step of asked prices under the limit and above it. */
	stepLimitCents: cents,
	stepLowCents: cents.min(1),
	stepHighCents: cents.min(1),
	leastCents: cents,
	marginCents: cents,
	/** Look, photo and tag, minutes for each part that is kept. */
	keepMinutes: count,
	/** Labour, cents an hour. */
	labourHourCents: z.object({ normal: cents, slow: cents, rush: cents }),
	/** Shelf cost of a part, cents a year, by its size. */
	shelfCents: z.object({ s: cents, m: cents, l: cents, xl: cents }),
	moneyRate: yearly,
	dyingRate: yearly,
	dyingRateAgeing: yearly,
	ownJobShare: share,
	staleDays: z.number().int().min(1).max(3650),
	/** How many donors may stand parked, and after how many days each is looked at again. */
	parkedMost: z.number().int().min(1).max(1000),
	parkedReviewDays: z.number().int().min(1).max(3650),
	waitingChance: share,
	/** Calls that a search which ended in nothing is worth. */
	askedWorth: share,
	/** Chance that a part is good, by the level its cause of death leaves it at. */
	chances: z.object({ high: share, medium: share, low: share, ruined: share }),
	/** What each proof multiplies the odds by. */
	proofOdds: z.object({
		'look-over': z.number().positive().max(1000),
		'seen running': z.number().positive().max(1000),
		'worked in place': z.number().positive().max(1000),
		'bench test cold': z.number().positive().max(1000),
		'bench test hot': z.number().positive().max(1000)
	}),
	/** What a figure that is believed weighs against what the shop has seen. */
	priors: z.object({
		/** Bench tests that a chance is worth. */
		chance: weight,
		/** Parts gone out that the share of come-backs is worth. */
		comeBacks: weight,
		/** Calls that calls a year are worth, at each step of what is seen. */
		calls: weight,
		/** Sales that a share of new is worth. */
		shareSales: weight
	}),
	/** Scrap, cents a kilogram, by metal class; what is absent is the usual middle. */
	scrapKgCents: z.record(z.string(), cents),
	families: z.record(z.string(), z.enum(['lots', 'some', 'hardly'])),
	kinds: z.record(z.string(), KindFigures),
	/** The shop's own bounds of what tests read: by kind, by field of its test. */
	limits: z.record(z.string(), z.record(z.string(), TestLimit))
});
export type Policy = z.infer<typeof Policy>;

/** Common practice, or from memory where no practice is written down; every figure may be edited. */
export const DEFAULT_POLICY: Policy = {
	shares: { 'clean used': 0.6, 'good used': 0.45, usable: 0.3, untested: 0.25, core: 0.1 },
	copyCap: 0.8,
	stepLimitCents: 5000,
	stepLowCents: 100,
	stepHighCents: 500,
	leastCents: 1000,
	marginCents: 500,
	keepMinutes: 4,
	labourHourCents: { normal: 3400, slow: 2000, rush: 7800 },
	shelfCents: { s: 20, m: 80, l: 250, xl: 800 },
	moneyRate: 0.1,
	dyingRate: 0.15,
	dyingRateAgeing: 0.3,
	ownJobShare: 0.9,
	staleDays: 180,
	parkedMost: 20,
	parkedReviewDays: 180,
	waitingChance: 0.7,
	askedWorth: 0.2,
	chances: { high: 0.9, medium: 0.6, low: 0.2, ruined: 0.02 },
	proofOdds: {
		'look-over': 1.5,
		'seen running': 6,
		'worked in place': 6,
		'bench test cold': 10,
		'bench test hot': 25
	},
	priors: { chance: 4, comeBacks: 20, calls: 10, shareSales: 5 },
	scrapKgCents: {},
	families: {},
	kinds: {},
	limits: {}
};

/** The shop's own figures laid over the defaults, one level deep where a figure has parts. */
export function withDefaults(own: Partial<Policy>): Policy {
	return Policy.parse({
		...DEFAULT_POLICY,
		...own,
		shares: { ...DEFAULT_POLICY.shares, ...own.shares },
		labourHourCents: { ...DEFAULT_POLICY.labourHourCents, ...own.labourHourCents },
		shelfCents: { ...DEFAULT_POLICY.shelfCents, ...own.shelfCents },
		chances: { ...DEFAULT_POLICY.chances, ...own.chances },
		proofOdds: { ...DEFAULT_POLICY.proofOdds, ...own.proofOdds },
		priors: { ...DEFAULT_POLICY.priors, ...own.priors }
	});
}
