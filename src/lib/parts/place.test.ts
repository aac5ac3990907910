import { describe, expect, it } from 'vitest';
import { placeOf, type Queued } from './place';

const part = (id: number, over: Partial<Queued> = {}): Queued => ({
	id,
	kind: 'coil',
	engineKey: 'grauviktwin72u',
	numberKeys: [],
	grade: 'good used',
	state: 'shelved',
	inRedBin: false,
	pulledAt: 1000,
	...over
});

describe('the place in the queue', () => {
	it('is the first when nothing else is there, and it does not stand before itself', () => {
		expect(placeOf(part(1), [])).toEqual({ place: 1, have: 1 });
		expect(placeOf(part(1), [part(1)])).toEqual({ place: 1, have: 1 });
	});
	it('two equal parts of one donor take successive places', () => {
		const both = [part(1), part(2)];
		expect(both.map((each) => placeOf(each, both).place)).toEqual([1, 2]);
	});
	it('at equal grade the older goes first, a better one always does', () => {
		expect(placeOf(part(1, { pulledAt: 2000 }), [part(2)]).place).toBe(2);
		expect(placeOf(part(1), [part(2, { pulledAt: 2000 })]).place).toBe(1);
		expect(placeOf(part(1), [part(2, { grade: 'clean used', pulledAt: 9000 })]).place).toBe(2);
		expect(placeOf(part(1), [part(2, { grade: 'usable', pulledAt: 1 })])).toEqual({
			place: 1,
			have: 2
		});
	});
	it.each([
		['held', part(2, { state: 'held' })],
		['out', part(2, { state: 'out' })],
		['back', part(2, { state: 'back' })],
		['missing', part(2, { state: 'missing' })],
		['in the red bin', part(2, { inRedBin: true })],
		['of another kind', part(2, { kind: 'stator' })],
		['of another engine', part(2, { engineKey: 'ondraketarn21l' })]
	])('one that is %s does not count', (_, other) => {
		expect(placeOf(part(1, { pulledAt: 5000 }), [other])).toEqual({ place: 1, have: 1 });
	});
	it('a shared part number is enough, no engine is not', () => {
		const mine = part(1, { engineKey: '', numberKeys: ['A1', 'B2'], pulledAt: 5000 });
		expect(placeOf(mine, [part(2, { engineKey: '', numberKeys: ['B2'] })]).place).toBe(2);
		expect(placeOf(mine, [part(2, { engineKey: '' })]).place).toBe(1);
	});
	it('a held part keeps its place but is not among those on the shelf', () => {
		expect(placeOf(part(1, { state: 'held' }), [part(2)])).toEqual({ place: 1, have: 1 });
	});
});
