function at(when: Date | string): Date {
	// a bare day is that day everywhere: noon keeps it in every zone that people mend engines in
	return typeof when === 'string' ? new Date(when.length === 10 ? `${when}T12:00Z` : when) : when;
}

/** The day, as read in the shop's time zone. */
export function date(when: Date | string, timeZone: string, locale = 'en-US'): string {
	const zone = typeof when === 'string' && when.length === 10 ? 'UTC' : timeZone;
	return new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeZone: zone }).format(at(when));
}

/** The day and the time, as read in the shop's time zone. */
export function dateTime(when: Date | string, timeZone: string, locale = 'en-US'): string {
	return new Intl.DateTimeFormat(locale, {
		dateStyle: 'medium',
		timeStyle: 'short',
		timeZone
	}).format(at(when));
}
