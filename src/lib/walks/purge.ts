import type { Verdict } from '../parts/verdict-view';
import { monthsBetween } from '../bins/age';
import type { PartState } from '../parts/words';

export const PURGE_MONTHS = 24;
/** What was kept at a purge is not asked about again before this. */
const ASK_AGAIN_MONTHS = 6;

/** What a purge needs to know of a part. */
export interface OnShelf {
	state: PartState;
	/** Its place in the queue for the next call, and how many of the same there are. */
	place: number;
	have: number;
	pulledAt: Date;
	/** The last use, sale, hold, want or search in vain for the like; null: none was seen. */
	lastCall: Date | null;
	verdict: Verdict['verdict'] | null;
	/** Somebody waits for it. */
	waiting: boolean;
	noLongerMade: boolean;
	keptAt: Date | null;
}

/**
 * Why a part is to be looked at in a purge, in words; null where it stays. Not called for in 24 months
 * with a better one of the same beside it, or not worth its place; never one that is promised,
 * waited for or no longer made.
 */
export function whyPurge(part: OnShelf, now: Date): string | null {
	if (!['shelved', 'pulled'].includes(part.state) || part.waiting || part.noLongerMade) return null;
	if (part.keptAt && monthsBetween(part.keptAt, now) < ASK_AGAIN_MONTHS) return null;
	if (part.verdict === 'let it go' || part.verdict === 'never') return 'not worth its place';
	const quiet = (since: Date) => monthsBetween(since, now) >= PURGE_MONTHS;
	const spare = part.have > 1 && part.place > 1;
	if (!spare || !quiet(part.pulledAt) || (part.lastCall && !quiet(part.lastCall))) return null;
	const since = part.lastCall
		? `last call ${monthsBetween(part.lastCall, now)} months ago`
		: `no call in ${PURGE_MONTHS} months`;
	return `${since}, ${part.have} of the same`;
}
