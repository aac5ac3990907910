/** The day it is somewhere, as 2026-03-12: days are compared as such, never as moments. */
export function dayIn(timeZone: string, now: Date): string {
	const parts = new Intl.DateTimeFormat('en', {
		timeZone,
		year: 'numeric',
		month: '2-digit',
		day: '2-digit'
	}).formatToParts(now);
	const get = (type: string) => parts.find((part) => part.type === type)?.value ?? '';
	return `${get('year')}-${get('month')}-${get('day')}`;
}

/** A day as people say it, 12 March; with the year when it is not this one. */
export function sayDay(day: string, today: string): string {
	const said: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'long', timeZone: 'UTC' };
	if (day.slice(0, 4) !== today.slice(0, 4)) said.year = 'numeric';
	return new Intl.DateTimeFormat('en-GB', said).format(new Date(`${day}T00:00:00Z`));
}

/** The day so many days after another. */
export function dayAfter(day: string, days: number): string {
	const at = new Date(`${day}T00:00:00Z`);
	at.setUTCDate(at.getUTCDate() + days);
	return at.toISOString().slice(0, 10);
}
