import { amount, check } from './figures';
import { gainFigures, type GainInput } from './gain-input';
import { wholeCents } from './money';
import { termsOf } from './values';

/** A part on a parked donor; `dyingRate` is that of the donor, `minutesAlone` to pull it with all before it. */
export interface ParkedInput extends GainInput {
	minutesAlone: number;
}

/**
 * What a part brings that stays on a parked donor and is pulled, cleaned and tested only when
 * somebody calls: the discounted chance of the call times what is then in hand, never below nil. It
 * pays no shelf; the yard is paid for the donor as a whole.
 * In: see GainInput, where minutesNow and shelfCents do not count, and the minutes of pulling it
 * alone. Out: whole cents. Throws WorthError naming the field, its unit and its range.
 */
export function pulledOnCall(input: ParkedInput): { cents: number } {
	const part = gainFigures(input);
	check(input, { minutesAlone: amount('minutes to pull it alone') });
	const { reach, sale, scrap } = termsOf(part);
	const work = part.labour * (input.minutesAlone + part.minutesLater);
	const inHand = part.chanceGood * sale + (1 - part.chanceGood) * scrap - work;
	return { cents: wholeCents(Math.max(0, reach * inHand)) };
}
