/** Months as people say them: 2 years 3 months. */
export function monthsSaid(months: number): string {
	const [years, rest] = [Math.floor(months / 12), months % 12];
	const of = (n: number, one: string) => (n === 0 ? '' : `${n} ${one}${n === 1 ? '' : 's'}`);
	return [of(years, 'year'), of(rest, 'month')].filter(Boolean).join(' ') || 'under a month';
}
