import { wholeCents } from './money';
import { tightBound } from './pull-bound';
import { questionOf } from './pull-choices';
import { goTogether, haulOf, readDonor, type Donor, type Haul } from './pull-donor';
import { guessFrom } from './pull-guess';
import { checkPull, type PullInput } from './pull-input';
import { workOrder } from './pull-order';
import { bestKept } from './pull-search';

/** A part to take off, with what all is spent and in hand once it is done. */
export interface PullStep {
	id: string;
	keep: boolean;
	minutes: number;
	runningMinutes: number;
	runningCents: number;
}

export interface PullPlan {
	order: PullStep[];
	minutes: number;
	totalCents: number;
	below: { id: string; minutes: number; totalCents: number }[];
}

function search(donor: Donor, limit: number): Haul {
	const question = questionOf(donor, limit);
	let best = haulOf([], donor);
	if (!question.choices.length) return best;
	const bound = tightBound(question, limit, (chosen) => {
		const guess = guessFrom(chosen, question, donor, limit);
		if (guess.cents > best.cents) best = guess;
		return best.cents;
	});
	for (const width of [20, 200, Infinity]) {
		const kept = bestKept(question, limit, bound, best.cents, width);
		if (kept) best = haulOf(kept, donor);
	}
	return best;
}

function steps(haul: Haul, donor: Donor): PullStep[] {
	let runningMinutes = 0;
	let cents = 0;
	return workOrder(haul, donor).map((part) => {
		const keep = haul.kept.has(part);
		const minutes = donor.minutes[part]! + (keep ? donor.keepMinutes[part]! : 0);
		runningMinutes += minutes;
		cents += (keep ? donor.net[part]! : 0) - donor.labour * donor.minutes[part]!;
		const runningCents = wholeCents(cents);
		return { id: donor.ids[part]!, keep, minutes, runningMinutes, runningCents };
	});
}

/** What taking one more off would cost and bring: with all before it, and what that would spoil. */
function added(part: number, haul: Haul, donor: Donor) {
	const more = [...donor.closures[part]!].filter((each) => !haul.off.has(each));
	const after: Haul = { ...haul, off: new Set([...haul.off, ...more]) };
	const spoiled = new Set(more.flatMap((each) => donor.ruins[each]!));
	after.kept = new Set([...haul.kept].filter((each) => !spoiled.has(each)));
	const lost = [...haul.kept].filter((each) => spoiled.has(each));
	const kept = { ...after, kept: new Set([...after.kept, part]) };
	const keep = donor.net[part]! > 0 && goTogether(kept, donor);
	const pull = more.reduce((sum, each) => sum + donor.minutes[each]!, 0);
	const cents = (keep ? donor.net[part]! : 0) - donor.labour * pull;
	return {
		id: donor.ids[part]!,
		minutes: pull + (keep ? donor.keepMinutes[part]! : 0),
		totalCents: wholeCents(lost.reduce((sum, each) => sum - donor.net[each]!, cents))
	};
}

/**
 * What to take off a donor in the minutes at hand, what of it to keep, and in which order: the set
 * of the greatest total, exactly; of equal ones that of fewer minutes. What stands before a part is
 * taken off with it, kept or not; a whole comes off before its pieces and is kept or they are, not
 * both; what a part ruins on its way is not kept.
 *
 * In: see PullInput; minutes, cents, labour in cents per minute. Out: the parts in working order
 * with running minutes and cents, the sums, and below the line each part that stays on, with the
 * minutes (what still stands before it included) and the cents that adding it would bring.
 * Throws WorthError naming the field, its unit and its range.
 */
export function pullPlan(input: PullInput): PullPlan {
	checkPull(input);
	const donor = readDonor(input);
	// a sum of tenths of a minute may sit a hair above a round limit
	const haul = search(donor, (input.minutes ?? Infinity) + 1e-9);
	const left = donor.ids.flatMap((_id, part) => (haul.off.has(part) ? [] : [part]));
	return {
		order: steps(haul, donor),
		minutes: haul.minutes,
		totalCents: wholeCents(haul.cents),
		below: left
			.map((part) => added(part, haul, donor))
			.sort((a, b) => b.totalCents - a.totalCents || a.minutes - b.minutes)
	};
}
