import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Kind, Level } from '$lib/trade';
import { gain, yearlyToContinuous } from '$lib/worth';
import type { Knowledge } from './knowledge';
import type { Item } from './market';
import { NORMAL_RATE } from './season';

const MONEY = yearlyToContinuous(DEFAULT_POLICY.moneyRate, 'money');

export interface Asked {
	item: Item;
	level: Level;
	tested: boolean;
	place: number;
	waiting: boolean;
}

function minutesLater({ cleanMinutes, testMinutes, cleanKeeps }: Kind, tested: boolean): number {
	if (!tested) return cleanMinutes + testMinutes;
	return cleanKeeps ? 0 : cleanMinutes;
}

/** Gain over scrapping it now, pulled and looked at already, and when to clean it. */
export function appraise(
	knows: Knowledge,
	{ item, level, tested, place, waiting }: Asked,
	{ at, rate }: { at: number; rate: number }
): { cents: number; cleanNow: boolean } {
	const { kind, comeBackCents, dyingRate, shelfCents, scrapCents } = item;
	const { terms } = gain({
		usedCents: knows.price(item, level),
		chanceGood: tested ? 1 : knows.chance(item, level),
		comeBack: knows.comeBack(kind),
		comeBackCents,
		kitCents: kind.kitCents,
		callsPerYear: knows.calls(item, at),
		place,
		moneyRate: MONEY,
		dyingRate,
		shelfCents,
		scrapCents,
		labourNow: rate,
		labour: NORMAL_RATE,
		minutesNow: 0,
		minutesLater: minutesLater(kind, tested),
		waiting: waiting ? DEFAULT_POLICY.waitingChance : 0
	});
	// where cleaning does not keep, the work waits for the call
	const now = kind.cleanKeeps ? terms.now : -Infinity;
	return {
		cents: Math.max(terms.whenCalled, now) - scrapCents,
		cleanNow: now > terms.whenCalled
	};
}
