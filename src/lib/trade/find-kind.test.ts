import { describe, expect, it } from 'vitest';
import { kinds, kindWords, matchKinds } from './index';
import { editsBetween, soundOf, wordsOf } from './spelling';

const ids = (text: string) => matchKinds(text).map((match) => match.kind.id);

describe('finding a kind by what people say', () => {
	it.each([
		['pull start 21h 3 bolt', 'recoil'],
		['puller cord thing old mower', 'recoil'],
		['recoyl for red', 'recoil'],
		['stator riding mower 2 yellow wires', 'stator'],
		['carb 42mm bolt to bolt', 'carb-float'],
		['carby for saw, cube type', 'carb-diaph'],
		['coyl 2 leg black', 'coil'],
		['magneto for tiller', 'coil'],
		['spark thing next to flywheel', 'coil'],
		['selonoid on bottom of carb', 'fuel-sol'],
		['exhaust w/ the cage', 'muffler'],
		['mufler 2 stud side out', 'muffler'],
		['gas tank left hand outlet metal', 'fuel-tank'],
		['gas cap w/ vent big', 'fuel-cap'],
		['bowl nut w jet', 'carb-bowl'],
		['gov spring long skinny', 'govspring'],
		['valve cover 4 bolt', 'vcover'],
		['push rods pair bent 1', 'rocker'],
		['oiler for saw', 'sawclutch'],
		['rear handle saw tank cracked', 'sawtank'],
		['snowblower plug in start button', 'starter120'],
		['friction wheel hub hex', 'friction'],
		['worm box', 'auger'],
		['canister wheel', 'wheel'],
		['gen no power need avr 2 plug', 'avr'],
		['pump 3 bolt 3/4 pw', 'pwpump'],
		['starter gear', 'drive'],
		['blade', 'mblade'],
		['ring gear', 'ringgear']
	])('%s: %s', (text, id) => {
		expect(ids(text)[0]).toBe(id);
	});

	it('finds every kind by each of its names and listed misspellings', () => {
		for (const each of kinds) {
			for (const said of [each.name, ...each.alsoCalled]) {
				expect(ids(said), `${each.id}: ${said}`).toContain(each.id);
				expect(ids(said.toUpperCase().split(' ').reverse().join(' '))).toContain(each.id);
			}
		}
	});

	it('offers both where a word may mean two kinds', () => {
		expect(ids('stater').sort()).toEqual(['starter12', 'stator']);
		expect(ids('stater 18hp 10 tooth')).toEqual(['starter12', 'stator']);
	});

	it('gives the longest name first and lets it claim its words', () => {
		expect(ids('fuel pump')).toEqual(['fuel-pump']);
		expect(ids('starter gear')).not.toContain('starter12');
	});

	it('says how it was found', () => {
		const how = (text: string) => matchKinds(text)[0]?.how;
		expect(how('muffler')).toBe('name');
		expect(how('silencer')).toBe('called');
		expect(how('carburretter')).toBe('sounds');
		expect(how('reciol')).toBe('near');
	});

	it('does not guess beside what was spelt right, nor at short or strange words', () => {
		expect(ids('recoil cube type')).toEqual(['recoil']);
		expect(ids('xyzzy')).toEqual([]);
		expect(ids('')).toEqual([]);
		expect(ids('zzq')).toEqual([]);
	});

	it('gives words to index a kind by', () => {
		expect(kindWords('recoil')).toEqual(expect.arrayContaining(['recoil', 'pull', 'rewind']));
		expect(kindWords('nothing')).toEqual([]);
	});
});

describe('spelling', () => {
	it.each([
		['recoil', 'recoil', 0],
		['recoil', 'reciol', 1],
		['stater', 'starter', 1],
		['ca', 'abc', 3],
		['', 'ab', 2]
	])('%s and %s are %i apart', (a, b, edits) => {
		expect(editsBetween(a, b, 5)).toBe(edits);
		expect(editsBetween(b, a, 5)).toBe(edits);
	});

	it('stops counting above the most', () => {
		expect(editsBetween('carburetor', 'muffler', 2)).toBe(3);
	});

	it('hears alike what sounds alike', () => {
		expect(soundOf('carberater')).toBe(soundOf('carburetor'));
		expect(soundOf('coyl')).toBe(soundOf('koil'));
		expect(soundOf('stator')).not.toBe(soundOf('starter'));
	});

	it('takes a text apart', () => {
		expect(wordsOf('Fuel shut-off / Valves, glass')).toEqual([
			'fuel',
			'shut',
			'off',
			'valve',
			'glass'
		]);
	});
});
