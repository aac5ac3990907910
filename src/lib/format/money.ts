/** Whole minor units as money to read: 4650 and USD give $46.50 in English. */
export function money(cents: number, currency: string, locale = 'en-US'): string {
	const shown = new Intl.NumberFormat(locale, { style: 'currency', currency });
	const digits = shown.resolvedOptions().maximumFractionDigits ?? 2;
	return shown.format(cents / 10 ** digits);
}

/** The same where room is short: $46, and $46.50 only where there are small coins. */
export function shortMoney(cents: number, currency: string, locale = 'en-US'): string {
	const shown = new Intl.NumberFormat(locale, {
		style: 'currency',
		currency,
		trailingZeroDisplay: 'stripIfInteger'
	});
	const digits = shown.resolvedOptions().maximumFractionDigits ?? 2;
	return shown.format(cents / 10 ** digits);
}

/** A share of 0 to 1 as a per cent to read. */
export function percent(share: number, locale = 'en-US', digits = 0): string {
	return new Intl.NumberFormat(locale, {
		style: 'percent',
		maximumFractionDigits: digits
	}).format(share);
}
