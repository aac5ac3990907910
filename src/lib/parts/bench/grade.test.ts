import { describe, expect, it } from 'vitest';
import { gradesFor } from './grade';

describe('the grade that goes with how a part was checked', () => {
	it('nobody has proved it: untested; a look proves only what needs no test', () => {
		expect(gradesFor('high', 'test')).toMatchObject({ '': 'untested', 'look-over': 'untested' });
		expect(gradesFor('high', 'look-over')).toMatchObject({ 'look-over': 'good used' });
	});
	it('a passed test is as good as the cause left the kind, and what is ruined is a core', () => {
		expect(gradesFor('high', 'test')['bench test hot']).toBe('clean used');
		expect(gradesFor('medium', 'test')['bench test cold']).toBe('good used');
		expect(gradesFor('low', 'test')['worked in place']).toBe('usable');
		expect(new Set(Object.values(gradesFor('ruined', 'test')))).toEqual(new Set(['core']));
	});
});
