import { z, type Row } from './row';
import { donorAnswers, donorFigures } from './worth-donor';
import { learnAnswer, learnFigures } from './worth-learn';

const amount = z.number().min(0);
const share = z.number().min(0).max(1);
const step = z.int().min(1);

const UsedPrice = z
	.object({
		newCents: amount,
		copyCents: amount.nullish(),
		share,
		copyCap: share,
		stepCents: z.union([
			step,
			z.array(z.object({ underCents: amount.nullish(), stepCents: step }))
		]),
		leastCents: amount
	})
	.openapi('UsedPriceFigures');

const Gain = z
	.object({
		usedCents: amount,
		chanceGood: share,
		comeBack: share,
		comeBackCents: amount,
		kitCents: amount.nullish(),
		callsPerYear: amount,
		place: z.int().min(1),
		moneyRate: amount,
		dyingRate: amount,
		shelfCents: amount,
		scrapCents: amount,
		labourNow: amount,
		labour: amount,
		minutesNow: amount,
		minutesLater: amount,
		waiting: share.nullish(),
		workWhenCalledOnly: z.boolean().nullish()
	})
	.openapi('GainFigures');

const KeepCleaning = z
	.object({
		alpha: amount,
		beta: amount,
		failures: z.int().min(0),
		worthCents: amount,
		attemptCents: amount
	})
	.openapi('CleaningFigures');

const cents = z.int().nullable();
const Answer = z.union([
	z.object({ usedCents: z.int(), cappedBy: z.literal('copy').nullable(), belowLeast: z.boolean() }),
	z.object({
		gainCents: z.int(),
		timing: z.enum(['when-called', 'now']),
		keepUpTo: z.int().nullable(),
		breakEvenUsedCents: cents,
		waitYears: z.number().nullable(),
		everCalled: z.number(),
		gainPerMinute: z.number().nullable(),
		terms: z.record(z.string(), z.number().nullable())
	}),
	z.object({ go: z.boolean(), inHandCents: z.int(), stopAfter: z.int().nullable() }),
	...donorAnswers,
	learnAnswer
]);

export const worth: Row[] = [
	{
		method: 'post',
		path: '/worth/{call}',
		said: 'The calculator, one calculation a call; nothing is kept',
		may: 'see',
		body: z.union([UsedPrice, Gain, KeepCleaning, ...donorFigures, ...learnFigures]),
		gives: Answer,
		changesNothing: true
	}
];
