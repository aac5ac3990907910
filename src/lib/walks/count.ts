import { walkingOrder, type Standing } from '../bins/route';

export const COUNT_BINS = 10;

export interface Counted extends Standing {
	lastCounted: Date | null;
}

/** The bins to look through now: those not counted for longest, never first, in walking order. */
export function binsToCount<T extends Counted>(bins: readonly T[], most = COUNT_BINS): T[] {
	const when = (bin: T) => bin.lastCounted?.getTime() ?? 0;
	const longest = walkingOrder(bins)
		.toSorted((a, b) => when(a) - when(b))
		.slice(0, most);
	return walkingOrder(longest);
}
