const day = new Intl.DateTimeFormat('en-GB', {
	day: 'numeric',
	month: 'long',
	year: 'numeric',
	timeZone: 'UTC'
});

/** The day a price was seen, for people: 3 March 2026. In: an ISO date. */
export const seenSaid = (seenOn: string): string => day.format(new Date(`${seenOn}T00:00:00Z`));
