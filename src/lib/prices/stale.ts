const DAY = 86_400_000;

/** A price older than the shop's limit still counts and is marked. `seenOn` is an ISO date. */
export const isStale = (seenOn: string, now: Date, limitDays: number): boolean =>
	Math.floor((now.getTime() - Date.parse(`${seenOn}T00:00:00Z`)) / DAY) > limitDays;

/** The day before which a seen price counts as stale, as an ISO date. */
export const staleBefore = (now: Date, limitDays: number): string =>
	new Date(now.getTime() - limitDays * DAY).toISOString().slice(0, 10);
