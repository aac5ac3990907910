import { kind } from '../trade';
import { monthsSaid } from './months';

const MONTH_MS = (365.25 / 12) * 24 * 3600 * 1000;
/** Months after which what ages is looked at again; from memory of the trade. */
const LOOK_AGAIN = 24;
const SLOW = 36;
const SLOWER: readonly string[] = ['avr', 'wheel', 'hood', 'fuel-tank'];

/** The age clock of a part whose kind ages: rubber, diaphragms, brittle plastic, electrolytes. */
export interface AgeClock {
	months: number;
	/** 2 years 3 months. */
	said: string;
	/** From this moment on it is to be looked at again. */
	lookAgain: Date;
	due: boolean;
}

/** Whole months between two moments, none where the second is earlier. */
export const monthsBetween = (from: Date, to: Date): number =>
	Math.max(0, Math.floor((to.getTime() - from.getTime()) / MONTH_MS));

/**
 * How old a part is and when to look again; null for a kind that does not age.
 * The clock starts when it is pulled; a passed test moves the day to look again, not its age.
 */
export function ageClock(
	kindId: string,
	pulledAt: Date,
	testedAt: Date | null,
	now: Date
): AgeClock | null {
	if (!kind(kindId).ages) return null;
	const months = monthsBetween(pulledAt, now);
	const from = Math.max(pulledAt.getTime(), testedAt?.getTime() ?? 0);
	const wait = SLOWER.includes(kindId) ? SLOW : LOOK_AGAIN;
	const lookAgain = new Date(from + wait * MONTH_MS);
	return { months, said: monthsSaid(months), lookAgain, due: lookAgain <= now };
}
