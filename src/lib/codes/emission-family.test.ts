import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { familyDisplacements, familyYears, readEmissionFamily } from './index';

const read = (typed: string, thisYear = 2026) => {
	const reading = readEmissionFamily(typed, thisYear);
	if ('problem' in reading) throw new Error(reading.problem);
	return reading;
};

// US EPA, "Information about Family Naming Conventions for Vehicles and Engines", 19 January 2021
describe('the year code of an emission family', () => {
	it.each([
		['1', 2001],
		['9', 2009],
		['A', 2010],
		['B', 2011],
		['C', 2012],
		['D', 2013],
		['E', 2014],
		['F', 2015],
		['G', 2016],
		['H', 2017],
		['J', 2018],
		['K', 2019],
		['L', 2020],
		['M', 2021],
		['N', 2022],
		['P', 2023],
		['R', 2024],
		['S', 2025],
		['T', 2026],
		['V', 2027],
		['W', 2028],
		['X', 2029],
		['Y', 2030]
	])('%s is %i', (code, year) => expect(familyYears(code)).toContain(year));

	it('comes again after thirty years', () => {
		expect(familyYears('V')).toEqual([1997, 2027]);
		expect(familyYears('Y')).toEqual([2000, 2030]);
		expect(familyYears('1')).toEqual([2001, 2031]);
		expect(familyYears('9')).toEqual([2009, 2039]);
		expect(familyYears('A')).toEqual([2010]);
	});

	it.each([...'IOQUZ0.-?', '', '12', 'a'])('%j is none', (code) =>
		expect(familyYears(code)).toEqual([])
	);

	it('names every year from 1997 to 2039 by one code', () => {
		const codes = [...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'];
		const years = codes.flatMap(familyYears).sort((a, b) => a - b);
		expect(years).toEqual(Array.from({ length: 43 }, (_, at) => 1997 + at));
	});
});

describe('the displacement in an emission family', () => {
	it('is in litres where a point takes one of the four places', () => {
		expect(familyDisplacements('.195')).toEqual([195]);
		expect(familyDisplacements('.726')).toEqual([726]);
		expect(familyDisplacements('1.95')).toEqual([1950]);
	});

	it('is in cm³ or cubic inches without one', () => {
		expect(familyDisplacements('0148')).toEqual([148, 2425.29]);
	});

	it.each(['0000', '.000', '19?5', 'FAM1', '195', '1..5', '195.', '00195'])(
		'%j is none',
		(places) => expect(familyDisplacements(places)).toEqual([])
	);
});

describe('an emission family', () => {
	it('is read by its places', () => {
		expect(read('HXXXS.1951AB')).toEqual({
			family: 'HXXXS.1951AB',
			years: [2017],
			likelyYear: 2017,
			maker: 'XXX',
			sector: 'S',
			displacementsCc: [195],
			own: '1AB'
		});
		expect(read('BXXXS.7262AA')).toMatchObject({
			likelyYear: 2011,
			displacementsCc: [726],
			own: '2AA'
		});
		expect(read('GXXXS0148ABC')).toMatchObject({
			likelyYear: 2016,
			displacementsCc: [148, 2425.29]
		});
	});

	it('takes the newest year that is not to come', () => {
		expect(read('VXXXS.1951AB', 2026).likelyYear).toBe(1997);
		expect(read('VXXXS.1951AB', 2027).likelyYear).toBe(2027);
		expect(read('4XXXS.1951AB', 2026).likelyYear).toBe(2004);
		expect(read('4XXXS.1951AB', 2034).likelyYear).toBe(2034);
		expect(read('XXXXS.1951AB', 1998).likelyYear).toBeNull();
	});

	it('takes spaces, small letters, any sector and doubtful characters', () => {
		expect(read(' hxxxp .1951ab ').family).toBe('HXXXP.1951AB');
		expect(read('?XXXS.1951AB')).toMatchObject({ years: [], likelyYear: null });
		expect(read('HXXXS.19?1AB').displacementsCc).toEqual([]);
	});

	it.each([
		['HXXXS.1951A', 'length'],
		['HXXXS.1951ABC', 'length'],
		['', 'length'],
		['IXXXS.1951AB', 'year'],
		['0XXXS.1951AB', 'year'],
		['HXXXS.1951A!', 'characters']
	])('%j has a problem: %s', (typed, problem) =>
		expect(readEmissionFamily(typed, 2026)).toEqual({ problem })
	);

	it('keeps every character that was typed, whatever it means', () => {
		const letters = fc.constantFrom(...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ.?-');
		const typed = fc.string({ unit: letters, minLength: 12, maxLength: 12 });
		fc.assert(
			fc.property(typed, fc.integer({ min: 1997, max: 2039 }), (text, thisYear) => {
				const reading = readEmissionFamily(text, thisYear);
				if ('problem' in reading) {
					expect(reading.problem).toBe('year');
					return;
				}
				const { family, maker, sector, own, years, likelyYear } = reading;
				expect(family).toBe(text);
				expect(text.startsWith(maker + sector, 1) && text.endsWith(own)).toBe(true);
				if (years.length === 2) expect(years[1]! - years[0]!).toBe(30);
				if (likelyYear !== null) expect(likelyYear).toBeLessThanOrEqual(thisYear);
			})
		);
	});
});
