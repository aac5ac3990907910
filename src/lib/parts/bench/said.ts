import { percent, plural } from '$lib/format';
import { minutesSaid } from '../plan-said';
import type { BenchKind, BenchView } from './view';

/** How many there are, and how many are worth keeping. */
export function shelfSaid({ have, keepUpTo, gainCents }: BenchKind): string {
	const there = have === 0 ? 'None to hand out' : `${have} to hand out`;
	if (gainCents === null) return there;
	if (keepUpTo === null) return `${there}, any number pays`;
	return `${there}, ${keepUpTo === 0 ? 'not even one pays' : `up to ${keepUpTo} pay`}`;
}

/** Minutes by itself and with what stands before it. */
export function timeSaid({ minutes, minutesAll, behind }: BenchKind): string {
	if (behind.length === 0 || minutesAll === minutes) return `${minutesSaid(minutes)} min`;
	return `${minutesSaid(minutes)} min, ${minutesSaid(minutesAll)} with what is before it`;
}

export const chanceSaid = ({ chance }: BenchKind): string =>
	`${percent(chance)} good before a test`;

/** Where the work stands. */
export function standsSaid(left: readonly BenchKind[]): string {
	if (left.length === 0) return 'The plan is done: stop here.';
	const minutes = left.reduce((sum, one) => sum + one.minutes, 0);
	return `${plural(left.length, 'part', 'parts')} to go, ${minutesSaid(minutes)} min, then stop`;
}

/** How a finished answer is said. */
export const doneSaid = ({ state, grade, destroyed, place }: BenchView['done'][number]): string => {
	if (state === 'scrapped') return destroyed ? 'destroyed' : 'to scrap';
	if (state === 'back') return `red bin${place ? ` ${place}` : ''}`;
	return place ? `${grade}, in ${place}` : grade;
};
