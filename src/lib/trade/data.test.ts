import { describe, expect, it } from 'vitest';
import { CAUSES, LEVEL_LETTERS } from './causes.data';
import {
	chanceLevel,
	checklist,
	findKind,
	isKindId,
	kind,
	kinds,
	SCRAP_CLASSES,
	worseLevel
} from './index';

describe('the kinds', () => {
	it('have ids of their own and name only kinds that are there', () => {
		expect(new Set(kinds.map((each) => each.id)).size).toBe(kinds.length);
		expect(kinds.length).toBe(122);
		for (const each of kinds) {
			for (const other of [
				...each.behind,
				...(each.ruins ?? []),
				...(each.partOf ? [each.partOf] : [])
			]) {
				expect(isKindId(other), `${each.id} names ${other}`).toBe(true);
				expect(other).not.toBe(each.id);
			}
			expect(SCRAP_CLASSES.map((one) => one.id)).toContain(each.scrapClass);
		}
	});

	it('have figures in their ranges', () => {
		for (const each of kinds) {
			expect(each.newLowCents).toBeLessThanOrEqual(each.newHighCents);
			expect(each.massLowGrams).toBeLessThanOrEqual(each.massHighGrams);
			expect(each.comeBack).toBeGreaterThan(0);
			expect(each.comeBack).toBeLessThan(0.5);
			expect(each.on.length).toBeGreaterThan(0);
			expect(Number.isInteger(each.pullMinutes) && each.pullMinutes >= 0).toBe(true);
			expect(each.reuse === 'never' || each.howTested !== '').toBe(true);
			expect(each.reuse === 'never' && each.callsPerYear > 0).toBe(false);
			expect(each.alsoCalled.join()).not.toMatch(/[()]/);
		}
	});

	it('are found by id or said to be missing', () => {
		expect(kind('recoil').callsPerYear).toBe(1.39);
		expect(findKind('nothing')).toBeNull();
		expect(() => kind('nothing')).toThrow(RangeError);
	});

	it('have a checklist exactly when they are safety kinds', () => {
		for (const each of kinds) {
			const lines = checklist(each.id);
			expect(lines.length > 0).toBe(each.reuse.startsWith('safety'));
			if (lines.length) expect(lines.length).toBeGreaterThanOrEqual(4);
			if (lines.length) expect(lines.at(-1)).toContain('qualified person');
		}
	});
});

describe('what a cause leaves', () => {
	it('is known for every kind that may be kept, and each cause', () => {
		for (const each of kinds.filter((one) => one.reuse !== 'never')) {
			expect(LEVEL_LETTERS[each.id], each.id).toMatch(new RegExp(`^[HMLX]{${CAUSES.length}}$`));
		}
		for (const id of Object.keys(LEVEL_LETTERS)) expect(isKindId(id)).toBe(true);
	});

	// common practice, no source: an engine that ran without oil and seized
	it('after no oil loses block, rod and piston and spares what hangs on them', () => {
		expect(['rod', 'piston', 'shortblock'].map((id) => chanceLevel(id, 'no-oil'))).toEqual([
			...['ruined', 'ruined', 'ruined']
		]);
		expect(chanceLevel('block', 'no-oil')).toBe('low');
		for (const id of ['carb-float', 'fuel-tank', 'coil', 'shroud', 'vcover']) {
			expect(chanceLevel(id, 'no-oil')).toBe('high');
		}
		expect(chanceLevel('starter12', 'no-oil')).toBe('medium');
	});

	it('is ruined for what nobody keeps, and the worse of two', () => {
		expect(chanceLevel('plug', 'retired')).toBe('ruined');
		expect(worseLevel('medium', 'high')).toBe('medium');
		expect(worseLevel('low', 'ruined')).toBe('ruined');
	});

	it('never calls a flywheel good after overspeed', () => {
		expect(chanceLevel('flywheel', 'overspeed')).toBe('ruined');
	});
});
