import { plural } from '$lib/format';
import type { PlanBelow, PlanStep, PlanView } from './plan-view';

type Say = (cents: number) => string;

const NAMED = 2;

/** "Shroud, Ignition coil and 3 more". */
function listed(names: readonly string[]): string {
	const shown = names.slice(0, NAMED).join(', ');
	const more = names.length - NAMED;
	return more > 0 ? `${shown} and ${more} more` : shown;
}

export const minutesSaid = (minutes: number): string => String(Math.round(minutes * 10) / 10);

/** What stands under a part that is taken off; null where it is simply kept. */
export function stepSaid(step: PlanStep): string | null {
	if (step.givenUpFor.length > 0) return `Given up for ${listed(step.givenUpFor)}`;
	if (!step.keep)
		return step.opens.length > 0 ? `Only in the way of ${listed(step.opens)}` : 'Not kept';
	return step.rough ? 'Roughly: it has no price yet' : null;
}

/** What taking off one more would take and bring. */
export function belowSaid(part: PlanBelow, say: Say): string {
	const more = `${minutesSaid(part.minutes)} more min`;
	if (part.goesWith) return `Stays with: ${part.goesWith}`;
	const money =
		part.totalCents >= 0
			? `would bring ${say(part.totalCents)}`
			: `would cost ${say(-part.totalCents)}`;
	return `${more}, ${money}${part.rough ? ', roughly' : ''}`;
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
	return `${of} min: keep these ${kept}, then stop. They bring ${say(totalCents)} after labour.`;
}
