/** A count with its word: 1 part, 2 parts. */
export function plural(count: number, one: string, many: string, locale = 'en-US'): string {
	return `${new Intl.NumberFormat(locale).format(count)} ${count === 1 ? one : many}`;
}
