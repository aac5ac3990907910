import { checklist } from '../trade';
import { expect, it } from 'vitest';
import { asksChecklist, unticked, whyNotStock } from './keeping';

it('refuses never-reuse kinds and ruined ones with the reason', () => {
	expect(whyNotStock('rod', false, '')).toContain('never used again');
	expect(whyNotStock('flywheel', true, 'overspeed, governor failed')).toContain('overspeed');
	expect(whyNotStock('flywheel', false, '')).toBeNull();
});

it('asks a safety kind for every line of its checklist', () => {
	expect(asksChecklist('brake')).toBe(true);
	expect(unticked('brake', [])).toEqual(checklist('brake'));
	expect(unticked('brake', checklist('brake'))).toEqual([]);
	expect(unticked('brake', checklist('brake').slice(1))).toHaveLength(1);
	expect(unticked('coil', [])).toEqual([]);
});
