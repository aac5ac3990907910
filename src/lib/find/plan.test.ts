import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { makeTag } from '../codes';
import { FindQuery, readQuestion } from './input';
import { readSearch } from './plan';

describe('reading what people type', () => {
	it.each<[string, string[], string[]]>([
		['pull start 21h 3 bolt', ['recoil', 'hardware'], ['21h']],
		['puller cord thing old Ondrake mower', ['recoil'], ['ondrake']],
		['recoyl for Grauvick red', ['recoil'], ['grauvick']],
		['stater 18hp 10 tooth', ['starter12', 'stator'], ['18hp', '10 tooth']],
		['stator riding mower 2 yellow wires', ['stator'], ['riding']],
		['carberator 6.5 w/ fuel shut off lever', ['fuel-sol', 'carb-float'], ['6.5']],
		['carb 42mm bolt to bolt', ['carb-float', 'hardware'], ['42mm']],
		['carby for saw, cube type', ['carb-diaph'], []],
		['coyl 2 leg black', ['coil'], ['leg']],
		['magneto for tiller', ['coil'], ['tiller']],
		['spark thing next to flywheel', ['coil', 'flywheel'], []],
		['selonoid on bottom of carb', ['fuel-sol'], ['bottom']],
		['selonoid battery side 4 post', ['solenoid'], ['post']],
		['flywheel 7 inch w ring gear no crack', ['flywheel', 'ringgear'], ['7 inch', 'crack']],
		['3/4 shaft crank 2 7/16', ['crank'], ['3/4', '2 7/16']],
		['one inch crank vertical 3 5/32', ['crank'], ['1 inch', 'vertical', '3 5/32']],
		['1in pulley 1/4 key', [], ['1in', 'pulley', '1/4', 'key']],
		['exhaust w/ the cage', ['muffler'], []],
		['mufler 2 stud side out', ['muffler'], []],
		['gas tank left hand outlet metal', ['fuel-tank'], ['left', 'hand', 'metal']],
		['gas cap w/ vent big', ['fuel-cap'], ['vent']],
		['bowl nut w jet', ['carb-bowl'], []],
		['gov spring long skinny', ['govspring'], ['long', 'skinny']],
		['linkage carb to govener', ['govspring', 'carb-float'], []],
		['tins for twin', ['tins'], []],
		['valve cover 4 bolt', ['vcover'], []],
		['head 12.5 ohv no strip plug', ['head'], ['12.5', 'strip']],
		['push rods pair bent 1', ['rocker'], ['pair', 'bent']],
		['jug and slug 50ish cc', ['cyl', 'piston'], ['50ish', 'cc']],
		['oiler for saw', ['sawclutch'], []],
		['rear handle saw tank cracked', ['sawtank'], ['cracked']],
		['snowblower plug in start button', ['starter120'], []],
		['friction wheel hub hex', ['friction'], ['hex']],
		['worm box', ['auger'], []],
		['spleens wore off shaft', [], ['spleens', 'wore', 'shaft']],
		['canister wheel', ['wheel'], []],
		['gen no power need avr 2 plug', ['avr'], ['power']],
		['pump 3 bolt 3/4 pw', ['pwpump'], ['3/4']],
		['12v starter under 50 tested', ['starter12'], ['12v']],
		['oct 24 blown engine starter good?', ['starter12'], []]
	])('%s', (typed, kinds, words) => {
		const plan = readSearch(typed);
		expect(plan.kinds).toEqual(expect.arrayContaining(kinds.slice(0, 1)));
		expect(plan.words).toEqual(expect.arrayContaining(words));
		expect(plan.numberKey).toBeNull();
	});

	it.each([
		['anything off a d05', { donorNumber: 5, words: [], kinds: [] }],
		['d12', { donorNumber: 12, words: [] }],
		['D12 carb', { donorNumber: 12, kinds: ['carb-float'] }],
		['k3', { bin: 'K3', words: [], donorNumber: null }],
		['K3-1', { bin: 'K3-1', words: [], numberKey: null }],
		['carb k3', { bin: 'K3', kinds: ['carb-float'], words: [] }]
	])('%s names a place', (typed, plan) => {
		expect(readSearch(typed)).toMatchObject(plan);
	});

	it.each([
		['TN-4471-02', 'TN447102'],
		['tn 4471 o2', 'TN447102'],
		['tn.4471/02', 'TN447102'],
		['TN—4471—O2', 'TN447102'],
		['4471', '4471'],
		['447', null],
		['HX270V', 'HX270V'],
		['coil 4471', null],
		['carburetor', null],
		['1'.repeat(25), null]
	])('%s as a part number: %s', (typed, key) => {
		expect(readSearch(typed).numberKey).toBe(key);
	});

	it('knows a tag however it is typed', () => {
		const drawn = [0, 1, 5, 9];
		let at = 0;
		const tag = makeTag(() => drawn[at++ % 4]! + at - (at % 4));
		const sloppy = tag.toLowerCase().replaceAll('0', 'o').replaceAll('1', 'l');
		expect(readSearch(tag).tag).toBe(tag);
		expect(readSearch(` ${sloppy.slice(0, 2)} ${sloppy.slice(2)} `).tag).toBe(tag);
	});

	it.each([
		['12v starter under 50 tested', { highCents: 5000, proof: 'tested' }],
		['coil clean used', { grade: 'clean used' }],
		['carb over $20 and under $35.50', { lowCents: 2000, highCents: 3550 }],
		['carb under 50cc', { highCents: null }],
		['untested coil', { grade: 'untested', proof: null }],
		['stator seen running', { proof: 'seen running' }]
	])('%s is said as a filter', (typed, filters) => {
		expect(readSearch(typed).filters).toMatchObject(filters);
	});

	it('reads causes and months as ways that a donor may have died and come in', () => {
		const { needs, kinds } = readSearch('oct 24 blown engine starter good?');
		expect(kinds).toEqual(['starter12']);
		expect(needs.map((need) => need.exact)).toEqual([
			['@2024-10'],
			expect.arrayContaining(['~thrown-rod', 'blown'])
		]);
	});

	it.each([
		['25 mm', '25mm'],
		['1 in', '25.4mm'],
		['one inch', '25.4mm'],
		['3/4', '19.1mm'],
		['19.05 mm', '19.1mm'],
		['¾"', '19.1mm'],
		['2 7/16', '61.9mm'],
		['210cc', '210cc'],
		['12.9 cu in', '211cc'],
		['10 teeth', '10tooth'],
		['12 volts', '12v']
	])('%s is compared as %s', (typed, lexeme) => {
		expect(readSearch(`${typed} part`).needs.map((need) => need.exact[0])).toEqual([lexeme]);
	});

	it('takes a power for the displacements that give it, when nothing says the power', () => {
		const [need] = readSearch('6.5 hp carb').needs;
		expect(need).toMatchObject({ said: '6.5 hp', exact: ['6.5hp', '65HP'] });
		expect(need!.near).toEqual(expect.arrayContaining(['196cc', '212cc', '6.5hp']));
		expect(need!.near).not.toContain('420cc');
	});

	it.each([
		['12?4561', '%12_4561%', '4561'],
		['tn-44?1?2', '%TN44_1_2%', 'TN44'],
		['good?', undefined, undefined],
		['1?', undefined, undefined]
	])('%s has characters that nobody could read', (typed, like, run) => {
		const { doubtful } = readSearch(typed);
		expect(doubtful?.like).toBe(like);
		expect(doubtful?.run ?? undefined).toBe(run);
	});

	it('finds the tags that one slip leads away from', () => {
		const tag = makeTag(() => 7 + Math.floor(Math.random() * 20));
		for (const typed of [
			tag.slice(1),
			`${tag}X`,
			tag.slice(0, 2) + (tag[2] === 'Z' ? 'Y' : 'Z') + tag.slice(3)
		])
			if (readSearch(typed).tag === null) expect(readSearch(typed).nearTags).toContain(tag);
	});

	it('tells starter and stator apart by what is said with them', () => {
		expect(readSearch('starter').kinds).not.toContain('stator');
		expect(readSearch('stator').kinds).toEqual(['stator']);
		expect(readSearch('stater 10 tooth')).toMatchObject({ ask: ['starter12', 'stator'] });
		expect(readSearch('stater 10 tooth').kinds[0]).toBe('starter12');
		expect(readSearch('stater 2 yellow wires').kinds[0]).toBe('stator');
		expect(readSearch('starter').ask).toEqual([]);
	});

	it('answers from the first letter on', () => {
		for (const typed of ['c', 'ca', 'car', 'carb', 'carbu', 'carbure'])
			expect(readSearch(typed).kinds, typed).toContain('carb-float');
	});

	it('asks about both where a word may be two kinds, and guesses one where it only comes near', () => {
		expect(readSearch('stater').kinds.sort()).toEqual(['starter12', 'stator']);
		expect(readSearch('reciol').kinds).toEqual(['recoil']);
		expect(readSearch('the good old red thing')).toMatchObject({ kinds: [], words: [] });
	});

	it('takes anything', () => {
		fc.assert(
			fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (typed) => {
				const plan = readSearch(typed);
				expect(plan.text).not.toMatch(/\p{C}/u);
				expect(plan.words.length).toBeLessThanOrEqual(8);
			}),
			{ numRuns: 200 }
		);
	});
});

describe('a question in an address', () => {
	it('reads filters, leaves out what is empty and cuts what is long', () => {
		const asked = readQuestion(new URLSearchParams(`q=${'x'.repeat(10_000)}&grade=&state=held`));
		expect(asked.q).toHaveLength(200);
		expect(asked).toMatchObject({ state: 'held', limit: 25 });
		expect(asked.grade).toBeUndefined();
	});

	it('refuses in words', () => {
		const said = (fields: object) => FindQuery.safeParse(fields).error?.issues[0]?.message;
		expect(said({ limit: '101' })).toBe('Enter a limit of 1 to 100');
		expect(said({ grade: 'shiny' })).toMatch(/^Choose a grade: clean used/);
		expect(said({ state: 'lost' })).toMatch(/^Choose a state/);
		expect(said({ cursor: "1.2.3.4.5' or 1" })).toBe('Start the list again from its beginning');
	});
});
