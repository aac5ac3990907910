import { z } from './row';

const amount = z.number().min(0);
const share = z.number().min(0).max(1);
const level = z.number().min(0.01).max(0.9999).nullish();
const believed = z.object({ mean: amount, worth: amount });

const LearnChance = z
	.object({
		prior: z.union([z.object({ alpha: amount, beta: amount }), believed]),
		observations: z.object({ successes: amount, failures: amount }),
		level
	})
	.openapi('ChanceFigures');

const LearnRate = z
	.object({
		prior: z.union([z.object({ shape: amount, years: amount }), believed]),
		observations: z.object({ calls: amount, years: amount }),
		level
	})
	.openapi('RateFigures');

const LearnShare = z
	.object({
		prior: z.object({ mean: share, worth: amount, spread: share.nullish() }),
		observations: z.union([
			z.array(share),
			z.object({ count: z.int().min(0), mean: share, spread: share })
		]),
		level
	})
	.openapi('ShareFigures');

/** What the calls about learning take. */
export const learnFigures = [LearnChance, LearnRate, LearnShare];

/** And what they give; years for a rate alone. */
export const learnAnswer = z.object({
	mean: z.number(),
	low: z.number(),
	high: z.number(),
	observations: z.number(),
	years: z.number().optional()
});
