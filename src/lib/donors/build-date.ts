const isMonth = (text: string) => Number(text) >= 1 && Number(text) <= 12;
const isDay = (text: string) => Number(text) >= 1 && Number(text) <= 31;
const isDayOfYear = (text: string) => Number(text) >= 1 && Number(text) <= 366;

const EARLIEST = 1950;

/** A year of two figures is the last such year that is not to come. */
const ofTwo = (text: string, thisYear: number): number => {
	const year = 2000 + Number(text);
	return year <= thisYear ? year : year - 100;
};

function ofOne(text: string, thisYear: number): number[] {
	const newest = thisYear - ((thisYear - Number(text)) % 10);
	const decades = Math.floor((newest - EARLIEST) / 10) + 1;
	return Array.from({ length: decades }, (_, back) => newest - back * 10).reverse();
}

type Habit = [shape: RegExp, years: (found: string[], thisYear: number) => number[]];

/** How makers write the day an engine was built; some plates follow none of these. */
const HABITS: Habit[] = [
	// 2019-05-31, 05/2019
	[/^(\d{4})[-/.](\d{1,2})(?:[-/.]\d{1,2})?$/, ([y, m]) => (isMonth(m!) ? [Number(y)] : [])],
	[/^(\d{1,2})[-/.](\d{4})$/, ([m, y]) => (isMonth(m!) ? [Number(y)] : [])],
	// 20190531
	[/^((?:19|20)\d\d)(\d\d)(\d\d)$/, ([y, m, d]) => (isMonth(m!) && isDay(d!) ? [Number(y)] : [])],
	// 19053104, 190531: the day, then plant and line
	[
		/^(\d\d)(\d\d)(\d\d)(?:\d\d)?$/,
		([y, m, d], now) => (isMonth(m!) && isDay(d!) ? [ofTwo(y!, now)] : [])
	],
	// 19151: year and day of the year
	[/^(\d\d)(\d{3})$/, ([y, d], now) => (isDayOfYear(d!) ? [ofTwo(y!, now)] : [])],
	// 9151: of which decade must be guessed
	[/^(\d)(\d{3})$/, ([y, d], now) => (isDayOfYear(d!) ? ofOne(y!, now) : [])]
];

/**
 * The years in which an engine can have been built, by the habits of codes. In: the code as it stands on
 * the plate; the year it is. Out: years from 1950 on that are not to come, the oldest first; none when the code follows no
 * habit. It is a hint: only the maker knows.
 */
export function buildYears(code: string, thisYear: number): number[] {
	const bare = code.replace(/\s/g, '');
	const years = HABITS.flatMap(([shape, read]) => {
		const found = shape.exec(bare);
		return found ? read(found.slice(1), thisYear) : [];
	});
	const possible = years.filter((year) => year >= EARLIEST && year <= thisYear);
	return [...new Set(possible)].sort((a, b) => a - b);
}
