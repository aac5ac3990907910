import { readEmissionFamily, familyDisplacements } from '../codes';
import { buildYears } from './build-date';

export interface PlateSaid {
	emissionFamily: string;
	displacementCc: number | null;
	dateCode: string;
}

const PLACES = 12;
const or = (figures: readonly (number | string)[]) => figures.join(' or ');
const inCc = (cc: number) => `${Math.round(cc)} cc`;

/** A family that lost its point is one short, and its figure stands where the point would. */
function withPoint(family: string): string | null {
	const pointed = `${family.slice(0, 5)}.${family.slice(5)}`;
	const whole = family.length === PLACES - 1 && familyDisplacements(pointed.slice(5, 9)).length > 0;
	return whole ? pointed : null;
}

/** The family as it was probably printed: a point that was not read is put back. */
export const mendFamily = (read: string): string => withPoint(read.toUpperCase()) ?? read;

/**
 * What an emission family means, in words for people; '' when there is none. The years it can mean come
 * thirty years apart, the likely one first.
 */
export function familySaid(family: string, thisYear: number): string {
	if (family === '') return '';
	const read = readEmissionFamily(family, thisYear);
	if ('problem' in read) {
		if (read.problem === 'year') return `${family.charAt(0)} stands for no model year. Look again.`;
		if (read.problem === 'characters')
			return 'It has letters, figures and a point only. Look again.';
		const length = family.replace(/\s/g, '').length;
		return `It has ${PLACES} characters, the point counts; this has ${length}. Look again.`;
	}
	const { years, likelyYear, displacementsCc } = read;
	const ordered = [...years].sort((a, b) => Number(b === likelyYear) - Number(a === likelyYear));
	const said = [
		years.length > 0 ? `Model year ${or(ordered)}` : 'Model year not read',
		displacementsCc.length > 0
			? or(displacementsCc.map(inCc))
			: `displacement not told (${read.family.slice(5, 9)})`
	];
	return said.join(', ');
}

/** Makers round, and people type what the shroud says: 208 is sold as 210. */
const near = (one: number, other: number) => Math.abs(one - other) <= Math.max(1.5, other * 0.03);

function displacementClash(meant: number[], typed: number | null): string[] {
	if (typed === null || meant.length === 0 || meant.some((cc) => near(cc, typed))) return [];
	const largest = meant.every((cc) => cc > typed)
		? ' A family is named by its largest engine.'
		: '';
	return [
		`The emission family says ${or(meant.map(inCc))}, the displacement says ${inCc(typed)}.${largest} Look at both again.`
	];
}

/** A model year begins at most a year before its calendar year does. */
function yearClash(years: number[], built: number[]): string[] {
	const fits = years.some((year) => built.includes(year) || built.includes(year - 1));
	if (years.length === 0 || built.length === 0 || fits) return [];
	return [
		`The emission family says model year ${or(years)}, the code says built in ${or(built.slice(-2))}. One of them is misread, or the label is from another engine.`
	];
}

/** Where the emission family does not go with the displacement or with the code, in words; none is usual. */
export function plateClashes(plate: PlateSaid, thisYear: number): string[] {
	const read = readEmissionFamily(plate.emissionFamily, thisYear);
	if ('problem' in read) return [];
	const built = buildYears(plate.dateCode, thisYear);
	const years = read.years.filter((year) => year <= thisYear + 1);
	return [
		...displacementClash(read.displacementsCc, plate.displacementCc),
		...yearClash(years, built)
	];
}
