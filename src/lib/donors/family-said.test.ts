import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildYears } from './build-date';
import { familySaid, mendFamily, plateClashes } from './family-said';

const plate = (emissionFamily: string, displacementCc: number | null = null, dateCode = '') =>
	plateClashes({ emissionFamily, displacementCc, dateCode }, 2026);

describe('the years an engine can be built in', () => {
	it.each([
		['19053104', [2019]],
		['190531', [2019]],
		['19 0531 04', [2019]],
		['87053104', [1987]],
		['19151', [2019]],
		['20101105', [2010, 2020]],
		['05/2019', [2019]],
		['2019-05-31', [2019]],
		['1366', [1951, 1961, 1971, 1981, 1991, 2001, 2011, 2021]],
		['9151', [1959, 1969, 1979, 1989, 1999, 2009, 2019]]
	])('of %j are %j', (code, years) => expect(buildYears(code, 2026)).toEqual(years));

	it.each(['', 'E2', '19993104', '1905?104', '19999', '9999', '13/2019', '2031-01'])(
		'of %j are not told',
		(code) => expect(buildYears(code, 2026)).toEqual([])
	);

	it('are never to come', () => {
		const figures = fc.stringMatching(/^\d{4,8}$/);
		fc.assert(
			fc.property(figures, fc.integer({ min: 1997, max: 2039 }), (code, now) => {
				for (const year of buildYears(code, now)) expect(year).toBeLessThanOrEqual(now);
			})
		);
	});
});

describe('an emission family in words', () => {
	it.each([
		['', ''],
		['HXXXS.1951AB', 'Model year 2017, 195 cc'],
		['VXXXS.1951AB', 'Model year 1997 or 2027, 195 cc'],
		['4XXXS.1951AB', 'Model year 2004 or 2034, 195 cc'],
		['GXXXS0148ABC', 'Model year 2016, 148 cc or 2425 cc'],
		['?XXXSFAM1ABC', 'Model year not read, displacement not told (FAM1)']
	])('%j is %j', (family, said) => expect(familySaid(family, 2026)).toBe(said));

	it('says what is wrong with it', () => {
		expect(familySaid('HXXXS1951AB', 2026)).toContain('12 characters');
		expect(familySaid('IXXXS.1951AB', 2026)).toContain('I stands for no model year');
	});

	it('gets back a point that was not read', () => {
		expect(mendFamily('HXXXS1951AB')).toBe('HXXXS.1951AB');
		expect(mendFamily('HXXXS.1951AB')).toBe('HXXXS.1951AB');
		expect(mendFamily('HXXXSABC1AB')).toBe('HXXXSABC1AB');
	});
});

describe('a clash on the plate', () => {
	it('is none where the displacement goes with the family', () => {
		expect(plate('HXXXS.1951AB', 195)).toEqual([]);
		expect(plate('HXXXS.2081AB', 210)).toEqual([]);
		expect(plate('GXXXS0148ABC', 148)).toEqual([]);
		expect(plate('GXXXS0148ABC', 2425)).toEqual([]);
		expect(plate('HXXXS.1951AB')).toEqual([]);
		expect(plate('', 210, '05053104')).toEqual([]);
		expect(plate('HXXX', 210, '05053104')).toEqual([]);
	});

	it('is said where it does not', () => {
		expect(plate('HXXXS.1951AB', 420)).toEqual([
			'The emission family says 195 cc, the displacement says 420 cc. Look at both again.'
		]);
		expect(plate('HXXXS.4201AB', 390)[0]).toContain('named by its largest engine');
	});

	it('is said where the engine was built in another year', () => {
		expect(plate('HXXXS.1951AB', null, '17053104')).toEqual([]);
		expect(plate('HXXXS.1951AB', null, '16110704')).toEqual([]);
		expect(plate('HXXXS.1951AB', null, 'E2')).toEqual([]);
		expect(plate('HXXXS.1951AB', null, '05053104')).toEqual([
			'The emission family says model year 2017, the code says built in 2005. One of them is misread, or the label is from another engine.'
		]);
	});

	it('takes both readings of a year code that comes again', () => {
		expect(plate('VXXXS.1951AB', null, '97053104')).toEqual([]);
		expect(plate('VXXXS.1951AB', null, '26053104')).toEqual([]);
		expect(plate('VXXXS.1951AB', null, '12053104')).toHaveLength(1);
	});
});
