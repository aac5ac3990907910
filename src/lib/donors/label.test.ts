import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SeenWord } from '../photos/seen';
import { readLabel } from './label';
import { headingsOf, slips } from './label-headings';
import { rowsOf, rowText } from './label-rows';

const WIDE = 0.012;
const HIGH = 0.03;

/** Lines of text as a look would have them: two spaces or more stand for a gap. */
function look(lines: readonly string[], sure = 0.95): SeenWord[] {
	return lines.flatMap((line, row) =>
		[...line.matchAll(/\S+/g)].map(({ 0: text, index }) => ({
			text,
			sure: [...text].map(() => sure),
			x: 0.1 + index * WIDE,
			y: 0.1 + row * 0.06,
			wide: text.length * WIDE,
			high: HIGH
		}))
	);
}

const read = (...looks: SeenWord[][]) =>
	readLabel({ turn: 0, looks }, ['Ondrake', 'Pellwyn Works']);
const found = (...looks: SeenWord[][]) =>
	Object.fromEntries(read(...looks).offers.map(({ field, value }) => [field, value]));

describe('the words of a label', () => {
	it('stand in lines, whatever the order in which they were seen', () => {
		const words = look(['MODEL: TARN-21L   TYPE 0417', 'SERIAL NO 7719']);
		fc.assert(
			fc.property(fc.shuffledSubarray(words, { minLength: words.length }), (some) => {
				expect(rowsOf(some).map(rowText)).toEqual(['MODEL TARN-21L TYPE 0417', 'SERIAL NO 7719']);
			})
		);
	});

	it('are cut where a heading is glued to what it heads', () => {
		expect(rowsOf(look(['S/N:7719024 |'])).map(rowText)).toEqual(['S/N 7719024']);
	});

	it('are headings though a letter is misread', () => {
		const fields = (line: string) => headingsOf(rowsOf(look([line]))[0]!).map(({ field }) => field);
		expect(fields('M0DEL X  TYPF Y  C0DE Z')).toEqual(['model', 'typeCode', 'dateCode']);
		expect(fields('SER1AL NO 5  ENGINE FAMILY F')).toEqual(['serial', 'emissionFamily']);
		expect(fields('EVAP FAMILY F  FUEL TYPE G')).toEqual(['other', 'other']);
		expect(fields('DATE CODE 5')).toEqual(['dateCode']);
		expect(fields('THIS MEETS 2017 RULES')).toEqual([]);
	});

	it('differ by slips that are the same both ways', () => {
		expect(slips('MODEL', 'MODE')).toBe(1);
		expect(slips('TYPE', 'TYRE')).toBe(1);
		const text = fc.string({ maxLength: 12 });
		fc.assert(
			fc.property(text, text, (one, other) => {
				expect(slips(one, other)).toBe(slips(other, one));
				expect(slips(one, one)).toBe(0);
				expect(slips(one, other) > 0).toBe(one !== other);
			})
		);
	});
});

describe('what a label offers', () => {
	it('is what stands beside the headings', () => {
		const label = look([
			'ONDRAKE ENGINES',
			'MODEL TARN-21L   TYPE 0417 E2   CODE 19053104',
			'SERIAL NO. 7719024   DISPLACEMENT: 12.9 cu in',
			'EMISSION FAMILY: HNDKS.2101AB   250 HOURS'
		]);
		expect(found(label)).toEqual({
			maker: 'Ondrake',
			model: 'TARN-21L',
			typeCode: '0417 E2',
			dateCode: '19053104',
			serial: '7719024',
			displacementCc: '211.4',
			emissionFamily: 'HNDKS.2101AB'
		});
	});

	it('is what stands under the headings of a table', () => {
		const label = look(['MODEL      TYPE       CODE', '21032      0417 E2    19053104']);
		expect(found(label)).toEqual({ model: '21032', typeCode: '0417 E2', dateCode: '19053104' });
	});

	it('is known by its shape where there is no heading', () => {
		expect(found(look(['FAM HNDKS.2101AB', '210 cc OHV']))).toEqual({
			displacementCc: '210',
			emissionFamily: 'HNDKS.2101AB'
		});
		expect(found(look(['CONTROLLABLE', 'INSTALLATION', '12 cc', 'HNDKS2101AB']))).toEqual({
			displacementCc: '12',
			emissionFamily: 'HNDKS.2101AB'
		});
	});

	it('is a maker of the shop, however misread, in the spelling of the shop', () => {
		expect(found(look(['0NDRAKF']))).toEqual({ maker: 'Ondrake' });
		expect(found(look(['PELLWYN W0RKS']))).toEqual({ maker: 'Pellwyn Works' });
		expect(found(look(['ONIONS']))).toEqual({});
	});

	it('is a name that stands out where the shop knows none, as a guess', () => {
		const label = look(['SOLLANE', 'MODEL X-1', 'SERIAL 12345']);
		const [first, ...rest] = label;
		const { offers } = read([{ ...first!, high: HIGH * 2 }, ...rest]);
		expect(offers[0]).toMatchObject({ field: 'maker', value: 'SOLLANE', legible: 'poor' });
	});

	it('is nothing of words that are no plate', () => {
		expect(found(look(['HOT SURFACE', 'KEEP AWAY', 'SERIAL', 'MODEL']))).toEqual({});
		expect(read().offers).toEqual([]);
		expect(read([]).lines).toEqual([]);
	});
});

describe('what several looks say', () => {
	const model = (text: string, sure?: number) => look([`MODEL ${text}`], sure);
	const offer = (...looks: SeenWord[][]) => read(...looks).offers[0]!;

	it('is clear where most agree', () => {
		expect(offer(model('TARN-21L'), model('TARN-21L'), model('TARN-21L'))).toMatchObject({
			value: 'TARN-21L',
			legible: 'clear',
			or: []
		});
		expect(offer(model('TARN-21L'), [], []).legible).toBe('fair');
	});

	it('is a question mark where they do not agree about a character', () => {
		expect(offer(model('TARN-21L'), model('TARN-27L'))).toMatchObject({
			value: 'TARN-2?L',
			legible: 'poor'
		});
		expect(offer(model('TARN-21L'), model('TARN-27L'), model('TARN-21L')).value).toBe('TARN-21L');
		expect(offer(model('TARN-21L', 0.2)).value).toBe('????????');
	});

	it('takes O and 0, spaces and small letters for no doubt', () => {
		expect(offer(model('TORN-21L'), model('T0RN-21L'), model('TORN-21L')).value).toBe('TORN-21L');
		expect(offer(model('0417 E2'), model('0417E2'), model('0417 E2')).value).toBe('0417 E2');
	});

	it('keeps another way to read it', () => {
		expect(offer(model('TARN-21L'), model('TARN-21L'), model('TARN-211L')).or).toEqual([
			'TARN-211L'
		]);
	});

	it('never offers a field twice, and stands on the picture', () => {
		const line = fc.constantFrom(
			...[
				'MODEL X1',
				'TYPE 04 MODEL',
				'CODE',
				'S/N 77',
				'210cc',
				'FAMILY HNDKS.2101AB',
				'###',
				'ONDRAKE'
			]
		);
		const looks = fc.array(fc.array(line, { maxLength: 6 }), { maxLength: 3 });
		fc.assert(
			fc.property(looks, (some) => {
				const { offers } = read(...some.map((lines) => look(lines)));
				expect(new Set(offers.map(({ field }) => field)).size).toBe(offers.length);
				for (const { spot, value } of offers) {
					expect(value).not.toBe('');
					expect(spot.wide).toBeGreaterThan(0);
					expect(spot.x + spot.wide).toBeLessThanOrEqual(1);
				}
			})
		);
	});
});
