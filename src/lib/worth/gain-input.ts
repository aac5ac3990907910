import { amount, check, share } from './figures';
import { WorthError } from './worth-error';

/**
 * One part. Amounts in cents, rates per year and continuous, minutes, chances 0 to 1. `place` is
 * its place in the queue: 1 for the first unit. `waiting` is the chance that a customer who waits
 * now, and whom no unit on the shelf answers, takes it.
 */
export interface GainInput {
	usedCents: number;
	chanceGood: number;
	comeBack: number;
	comeBackCents: number;
	kitCents?: number | null;
	callsPerYear: number;
	place: number;
	moneyRate: number;
	dyingRate: number;
	shelfCents: number;
	scrapCents: number;
	labourNow: number;
	labour: number;
	minutesNow: number;
	minutesLater: number;
	waiting?: number | null;
	/** Cleaning that does not keep: the work is always done when called. */
	workWhenCalledOnly?: boolean | null;
}

export type GainFigures = {
	[Field in Exclude<keyof GainInput, 'workWhenCalledOnly'>]-?: number;
} & { workWhenCalledOnly: boolean };

const figures = {
	usedCents: amount('used price in cents'),
	chanceGood: share('chance that it is good'),
	comeBack: share('chance that it comes back'),
	comeBackCents: amount('cost of a come-back in cents'),
	kitCents: { unit: 'cost of the kit in cents', optional: true },
	callsPerYear: amount('calls per year'),
	place: { unit: 'place in the queue', least: 1, whole: true },
	moneyRate: amount('cost of money, continuous rate per year'),
	dyingRate: amount('dying, continuous rate per year'),
	shelfCents: amount('shelf cost in cents per year'),
	scrapCents: amount('scrap value in cents'),
	labourNow: amount('labour now in cents per minute'),
	labour: amount('labour in cents per minute'),
	minutesNow: amount('minutes to spend now'),
	minutesLater: amount('minutes that can wait'),
	waiting: { unit: 'chance that the waiting customer takes it', most: 1, optional: true }
};

/** Checked figures with what may be left out filled in. Throws WorthError naming the field. */
export function gainFigures(input: GainInput): GainFigures {
	check(input, figures);
	if (input.callsPerYear === 0 && input.moneyRate + input.dyingRate === 0) {
		throw new WorthError(
			'callsPerYear',
			'callsPerYear: calls per year, above 0 where moneyRate and dyingRate are both 0'
		);
	}
	const { workWhenCalledOnly = false } = input;
	if (workWhenCalledOnly !== null && typeof workWhenCalledOnly !== 'boolean') {
		throw new WorthError(
			'workWhenCalledOnly',
			'workWhenCalledOnly: whether the work must wait for the call, true or false'
		);
	}
	return {
		...input,
		kitCents: input.kitCents ?? 0,
		waiting: input.waiting ?? 0,
		workWhenCalledOnly: workWhenCalledOnly ?? false
	};
}
