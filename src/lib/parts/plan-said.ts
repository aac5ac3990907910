import { plural } from '$lib/format';
import type { PlanBelow, PlanStep, PlanView } from './plan-view';

type Say = (cents: number) => string;

const NAMED = 2;
const NOTHING = 50;

/** A name without what it says in brackets. */
export const bareName = (name: string): string => name.replace(/ \(.*\)$/, '');

/** "Shroud, Ignition coil and 3 more". */
function listed(names: readonly string[]): string {
	const shown = names.slice(0, NAMED).map(bareName).join(', ');
	const more = names.length - NAMED;
	return more > 0 ? `${shown} and ${more} more` : shown;
}

export const minutesSaid = (minutes: number): string => String(Math.round(minutes * 10) / 10);

/** What stands under a part that is taken off; null where it is simply kept. */
export function stepSaid(step: PlanStep): string | null {
	if (step.goesWith) return `Stays with: ${step.goesWith}`;
	if (step.givenUpFor.length > 0) return `Given up for ${listed(step.givenUpFor)}`;
	if (!step.keep)
		return step.opens.length > 0 ? `Only in the way of ${listed(step.opens)}` : 'Not kept';
	return step.rough ? 'roughly, no price yet' : null;
}

/** What taking off one more would take and bring. */
export function belowSaid(part: PlanBelow, say: Say): string {
	const more = `${minutesSaid(part.minutes)} more min`;
	if (part.goesWith) return `Stays with: ${part.goesWith}`;
	if (part.sacrificedFor.length > 0) return `Sacrificed for ${listed(part.sacrificedFor)}`;
	const spoils = part.spoils.length > 0 ? `, spoils ${listed(part.spoils)}` : '';
	const brings = part.totalCents > 0;
	const some = `would ${brings ? 'bring' : 'cost'} ${say(Math.abs(part.totalCents))}`;
	const money = Math.abs(part.totalCents) < NOTHING ? 'would bring next to nothing' : some;
	return `${more}, ${money}${part.rough ? ', roughly' : ''}${spoils}`;
}

/** The plan in one sentence. */
export function planSaid(
	{ order, minutes, minutesAtHand, totalCents }: PlanView,
	say: Say
): string {
	if (order.length === 0)
		return minutesAtHand === null
			? 'Nothing that is left pays for its minutes.'
			: 'Nothing pays in these minutes.';
	const spent = minutesSaid(minutes);
	const of = minutesAtHand === null ? spent : `${spent} of ${minutesSaid(minutesAtHand)}`;
	const kept = plural(order.filter(({ keep }) => keep).length, 'part', 'parts');
	return `${of} min: keep ${kept}, then stop. ${say(totalCents)} after labour.`;
}

const STEPS = [5, 10, 15, 30, 60, 120];
const MOST_TICKS = 6;

/** Round minutes along the strip, from its start; its end has a label of its own. */
export function ticksTo(minutes: number): number[] {
	const step =
		STEPS.find((each) => minutes / each <= MOST_TICKS) ?? Math.ceil(minutes / MOST_TICKS);
	const all = Array.from({ length: MOST_TICKS + 1 }, (_, at) => at * step);
	return all.filter((tick) => tick < minutes * 0.85);
}
