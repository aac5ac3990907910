import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { groupsOf, planned, shown, stillOn } from './next';
import type { BenchKind, BenchView } from './view';

const one = (kind: string, over: Partial<BenchKind> = {}) =>
	({ kind, kindName: kind, plan: 'keep', goesWith: null, machine: false, ...over }) as BenchKind;
const view = (kinds: BenchKind[]) => ({ kinds }) as BenchView;
const leave = (kind: string) => ({ key: kind, answer: { what: 'leave' as const, kind } });

describe('what stands on the bench', () => {
	const kinds = [one('coil'), one('stator'), one('vcover', { goesWith: 'Cylinder head' })];
	it('is less by what was answered and is still on its way', () => {
		expect(stillOn(view(kinds), [leave('coil')]).map(({ kind }) => kind)).toEqual([
			...['stator', 'vcover']
		]);
	});
	it('pieces go with their whole and are not asked for', () => {
		expect(planned(kinds).map(({ kind }) => kind)).toEqual(['coil', 'stator']);
	});
	it('what is before the eyes stays, whatever else comes off, until it is gone itself', () => {
		const ids = ['a', 'b', 'c', 'd', 'e'];
		fc.assert(
			fc.property(fc.subarray(ids), fc.constantFrom(...ids), (off, before) => {
				const left = ids.filter((id) => !off.includes(id)).map((id) => one(id));
				const { next, gone } = shown(left, before);
				expect(gone).toBe(off.includes(before));
				if (!gone) expect(next?.kind).toBe(before);
				else expect(next?.kind).toBe(left[0]?.kind);
			})
		);
	});
	it('a kind below the stop line may be chosen, and then stays too', () => {
		const below = one('block', { plan: null });
		expect(shown([...kinds, below], 'block').next).toBe(below);
		expect(shown([below], null)).toEqual({ next: null, gone: false });
	});
	it('stands in groups, none of them empty, each kind in one', () => {
		const all = [
			...kinds,
			one('block', { plan: null }),
			one('wheel', { plan: null, machine: true })
		];
		const groups = groupsOf(all, 'a mower');
		expect(groups.flatMap((group) => group.kinds)).toHaveLength(all.length);
		expect(groups.map(({ title }) => title)).toContain('Off the machine: a mower');
		expect(groupsOf([], '')).toEqual([]);
	});
});
