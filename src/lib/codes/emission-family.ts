export interface EmissionFamily {
	/** Upper case, without spaces; `?` stands for a character that cannot be read. */
	family: string;
	/** Model years that the first character can mean, the oldest first; none when it cannot be read. */
	years: number[];
	/** The newest of them that is not in the future; null when the year cannot be read. */
	likelyYear: number | null;
	/** Who made it, in three characters. */
	maker: string;
	/** What sort of engine it is for. */
	sector: string;
	/** What the four places of the displacement can mean, in cc; none when they say a type of family. */
	displacementsCc: number[];
	/** The last three characters: the maker's own. */
	own: string;
}

export type EmissionFamilyReading = EmissionFamily | { problem: 'length' | 'year' | 'characters' };

const YEAR_CODES = '123456789ABCDEFGHJKLMNPRSTVWXY';
const CYCLE = YEAR_CODES.length;
/** The year of the code 1, and the span in which the code is known to stand. */
const FIRST_OF_CYCLE = 2001;
const SINCE = 1997;
const UNTIL = 2039;
const CC_PER_CUBIC_INCH = 16.387064;
const LENGTH = 12;

/**
 * The model years of a year code: 1 to 9 and the letters without I, O, Q, U and Z, over again every
 * thirty years, from 1997 (V) to 2039 (9). In: one character. Out: the years, the oldest first; none
 * when it is no such code.
 */
export function familyYears(code: string): number[] {
	const at = code.length === 1 ? YEAR_CODES.indexOf(code) : -1;
	if (at < 0) return [];
	const years = [-CYCLE, 0, CYCLE].map((cycle) => FIRST_OF_CYCLE + at + cycle);
	return years.filter((year) => year >= SINCE && year <= UNTIL);
}

/**
 * The displacement that four places can mean. With a point they are litres, the point being one of the
 * places; without they are cm³ or cubic inches, which only the size of the engine tells apart. In: four
 * characters. Out: cc, to a hundredth, in falling likelihood; none when they are no figure above 0.
 */
export function familyDisplacements(places: string): number[] {
	if (!/^(?=.{4}$)\d*\.?\d+$/.test(places) || Number(places) === 0) return [];
	const figure = Number(places);
	const meant = places.includes('.') ? [figure * 1000] : [figure, figure * CC_PER_CUBIC_INCH];
	return meant.map((cc) => Math.round(cc * 100) / 100);
}

/**
 * Reads an emission family (engine family) as its name says. Source: US EPA, "Information about Family
 * Naming Conventions for Vehicles and Engines", snapshot of 19 January 2021. In: the family as typed or
 * read, spaces and case do not matter, `?` for a doubtful character; the year it is. Out: what its places
 * mean, or what is wrong: not twelve characters, a first one that is no year code, or a character that no
 * family has. Any sector is taken. It is a hint: the label and the engine decide.
 */
export function readEmissionFamily(typed: string, thisYear: number): EmissionFamilyReading {
	const family = typed.toUpperCase().replace(/\s/g, '');
	if (family.length !== LENGTH) return { problem: 'length' };
	if (!/^[0-9A-Z.?-]+$/.test(family)) return { problem: 'characters' };
	const code = family.charAt(0);
	const years = familyYears(code);
	if (years.length === 0 && code !== '?') return { problem: 'year' };
	return {
		family,
		years,
		likelyYear: years.findLast((year) => year <= thisYear) ?? null,
		maker: family.slice(1, 4),
		sector: family.charAt(4),
		displacementsCc: familyDisplacements(family.slice(5, 9)),
		own: family.slice(9)
	};
}
