import { Mod37_36 } from '@konfirm/iso7064';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkCharacter, isTag, makeTag, readTag, TAG_SYMBOLS } from './index';

const draws = fc.array(fc.integer({ min: 0, max: 0xffffffff }), { minLength: 64, maxLength: 64 });
const tags = draws.map((drawn) => {
	let at = 0;
	return makeTag(() => drawn[at++ % drawn.length]! + at);
});

describe('the check character', () => {
	it('is that of the example of ISO 7064 MOD 37,36', () => {
		expect(checkCharacter('A12425GABC1234002')).toBe('M');
	});

	it('agrees with another implementation on any body', () => {
		const bodies = fc.string({
			unit: fc.constantFrom(...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'),
			minLength: 1,
			maxLength: 20
		});
		fc.assert(
			fc.property(bodies, (body) => {
				expect(checkCharacter(body)).toBe(Mod37_36.checksum(body));
			})
		);
	});

	it('refuses other characters', () => {
		expect(() => checkCharacter('AB-1')).toThrow(RangeError);
		expect(() => checkCharacter('ab')).toThrow(RangeError);
	});
});

describe('a tag', () => {
	it('has five characters and never I, L, O or U', () => {
		fc.assert(
			fc.property(tags, (tag) => {
				expect(tag).toMatch(/^[0-9A-HJKMNP-TV-Z]{5}$/);
				expect(isTag(tag)).toBe(true);
				expect(Mod37_36.validate(tag)).toBe(true);
			})
		);
	});

	it('draws again where the check would be a character that is left out', () => {
		const skipped = [...TAG_SYMBOLS].find((last) => 'ILOU'.includes(checkCharacter(`000${last}`)))!;
		const drawn = [0, 0, 0, TAG_SYMBOLS.indexOf(skipped), 1, 2, 3, 5];
		let at = 0;
		expect(makeTag(() => drawn[at++]!)).toBe('1235' + checkCharacter('1235'));
		expect(at).toBe(8);
	});

	it('refuses a source that gives fractions or does not vary', () => {
		expect(() => makeTag(() => 0.5)).toThrow(RangeError);
		expect(() => makeTag(() => -1)).toThrow(RangeError);
		const skipped = [...TAG_SYMBOLS].findIndex((one) =>
			'ILOU'.includes(checkCharacter(one.repeat(4)))
		);
		expect(skipped).toBeGreaterThanOrEqual(0);
		expect(() => makeTag(() => skipped)).toThrow('does not vary');
	});

	it('shows every change of a single character', () => {
		fc.assert(
			fc.property(tags, (tag) => {
				for (let at = 0; at < tag.length; at += 1) {
					for (const other of TAG_SYMBOLS.replace(tag.charAt(at), '')) {
						const changed = tag.slice(0, at) + other + tag.slice(at + 1);
						expect(isTag(changed)).toBe(false);
						expect(readTag(changed)).toMatchObject({ problem: 'check' });
					}
				}
			}),
			{ numRuns: 40 }
		);
	});
});

describe('reading what was typed', () => {
	it('gives back any tag, whatever the case, spaces and dashes', () => {
		fc.assert(
			fc.property(tags, (tag) => {
				expect(readTag(tag)).toEqual({ tag });
				const sloppy = ` ${tag.slice(0, 2).toLowerCase()}-${tag.slice(2, 4)} – ${tag.slice(4)}`;
				expect(readTag(sloppy)).toEqual({ tag });
			})
		);
	});

	it('takes O for 0, I and L for 1', () => {
		const tag = ['0011', '1010', '0110', '1100', '0101']
			.map((b) => b + checkCharacter(b))
			.find(isTag)!;
		const typed = tag.replace('0', 'o').replace('0', 'O').replace('1', 'l').replace('1', 'i');
		expect(typed).not.toBe(tag);
		expect(readTag(typed)).toEqual({ tag });
	});

	it('says what is wrong', () => {
		for (const short of ['', '12', '123456', '-- --']) {
			expect(readTag(short)).toEqual({ problem: 'length' });
		}
		expect(readTag('0000U')).toMatchObject({ problem: 'check' });
		expect(readTag('ÄÖ12?')).toMatchObject({ problem: 'check' });
	});

	it('offers the tag with two neighbours swapped back, when only one comes out', () => {
		const tag = '3K7V' + checkCharacter('3K7V');
		expect(isTag(tag)).toBe(true);
		const reading = readTag(tag.charAt(1) + tag.charAt(0) + tag.slice(2));
		expect(reading).toEqual({ problem: 'check', suggestion: tag });
	});
});
