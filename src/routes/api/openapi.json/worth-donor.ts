import { z } from './row';

const amount = z.number().min(0);
const share = z.number().min(0).max(1);
const count = z.int().min(0);
const ids = z.array(z.string()).nullish();

const PullPlan = z
	.object({
		parts: z.array(
			z.object({
				id: z.string().min(1),
				behind: ids,
				partOf: z.string().nullish(),
				ruins: ids,
				minutes: amount,
				keepMinutes: amount.nullish(),
				gainCents: z.number()
			})
		),
		minutes: amount.nullish(),
		labourNow: amount
	})
	.openapi('PullPlanFigures');

export const Decide = z
	.object({
		fixChance: share,
		fixedPriceCents: amount,
		fixReach: share,
		newPartsCents: amount,
		labourCents: amount,
		parkCents: amount,
		yardCents: amount,
		stripTotalCents: amount,
		wholePriceCents: amount,
		wholeReach: share,
		handlingCents: amount,
		scrapAllCents: amount,
		disposalCents: amount
	})
	.openapi('DecisionFigures');

const Allocate = z
	.object({
		jointCents: count,
		byProductCents: count,
		parts: z.array(
			z.object({
				id: z.string(),
				askedCents: amount.nullish(),
				ownCostCents: amount.nullish(),
				splitOffCents: amount.nullish(),
				grams: amount.nullish()
			})
		),
		method: z.enum(['nrv', 'split-off', 'physical'])
	})
	.openapi('AllocationFigures');

const Carry = z
	.object({ costCents: amount, netRealisableCents: z.number() })
	.openapi('CarryingFigures');

/** What the calls about a donor and its costs take. */
export const donorFigures = [PullPlan, Decide, Allocate, Carry];

const left = { id: z.string(), minutes: z.number() };
export const PlannedStep = z.object({
	...left,
	keep: z.boolean(),
	runningMinutes: z.number(),
	runningCents: z.int()
});
export const PlannedBelow = z.object({ ...left, totalCents: z.int() });
export const Planned = z.object({
	order: z.array(PlannedStep),
	minutes: z.number(),
	totalCents: z.int(),
	below: z.array(PlannedBelow)
});

const choice = z.enum(['fix', 'park', 'strip', 'whole', 'scrap']);
export const Tip = z.object({
	input: z.string(),
	at: z.number(),
	choice,
	when: z.enum(['above', 'below'])
});
export const Decided = z.object({
	choices: z.array(z.object({ choice, cents: z.int() })),
	tips: z.array(Tip)
});

/** And what they give. */
export const donorAnswers = [
	Planned,
	Decided,
	z.object({
		shares: z.array(z.object({ id: z.string(), cents: z.int() })),
		lossCents: z.int(),
		incomeCents: z.int()
	}),
	z.object({ carriedCents: z.int(), writeDownCents: z.int() })
];
