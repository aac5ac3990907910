import { ChoiceFigures, PlanQuestion } from '$lib/parts/choices-form';
import { z, type Row } from './row';
import { Decide, Decided, Planned, PlannedBelow, PlannedStep, Tip } from './worth-donor';

const kindName = z.string();
const goesWith = z.string().nullable().describe('The whole that it stays with');
const waitingFor = z.string().nullable().describe('Who waits for it, without a name');
const rough = z.boolean().describe('Counted at the middle of its kind: it has no price');

const Plan = Planned.extend({
	minutesAtHand: z.number().nullable().describe('Null: no limit'),
	order: z.array(
		PlannedStep.extend({
			id: z.string().describe('Id of the kind'),
			kindName,
			rough,
			goesWith,
			waitingFor,
			opens: z.array(z.string()).describe('What it opens the way to, where it is not kept'),
			givenUpFor: z.array(z.string()).describe('What it is given up for, though worth keeping')
		})
	),
	below: z.array(
		PlannedBelow.extend({
			kindName,
			rough,
			goesWith,
			waitingFor,
			sacrificedFor: z.array(z.string()).describe('What spoils it on its way off'),
			spoils: z.array(z.string()).describe('What is kept and would be spoiled by it')
		})
	),
	unpriced: z.int()
}).openapi('PullPlan');

const Choices = Decided.extend({
	repairTips: z.array(Tip).describe('By the cost of the repair, parts and labour together'),
	figures: Decide.nullable().describe('Null for those who may not see the terms'),
	given: z.array(z.string()).describe('Figures that were given, not usual')
}).openapi('Choices');

/** What a donor is worth, this way or that. */
export const donorWorth: Row[] = [
	{
		method: 'get',
		path: '/donors/{donor}/plan',
		said: 'What to take off it in the minutes at hand, in which order, and where to stop',
		may: 'see',
		query: PlanQuestion,
		gives: Plan
	},
	{
		method: 'get',
		path: '/donors/{donor}/choices',
		said: 'Fix, park, strip, sell whole or scrap, best first; figures of its own may be given',
		may: 'see',
		query: ChoiceFigures,
		gives: Choices,
		shut: true
	}
];
