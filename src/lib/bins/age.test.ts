import { describe, expect, it } from 'vitest';
import { ageClock } from './age';
import { monthsSaid } from './months';

const NOW = new Date('2026-03-14T12:00:00Z');
const at = (day: string) => new Date(`${day}T12:00:00Z`);

describe('the age clock', () => {
	it('runs only on what ages', () => {
		expect(ageClock('coil', at('2020-01-01'), null, NOW)).toBeNull();
	});

	it('starts when the part is pulled and asks for a look after two years', () => {
		const young = ageClock('fuel-pump', at('2025-01-10'), null, NOW);
		expect(young).toMatchObject({ months: 14, said: '1 year 2 months', due: false });
		expect(ageClock('fuel-pump', at('2024-03-01'), null, NOW)?.due).toBe(true);
	});

	it('gives plastic and electrolytes three', () => {
		expect(ageClock('hood', at('2024-01-01'), null, NOW)?.due).toBe(false);
		expect(ageClock('hood', at('2023-03-01'), null, NOW)?.due).toBe(true);
	});

	it('puts the look off after a passed test, but it does not get younger', () => {
		const tested = ageClock('fuel-pump', at('2022-03-14'), at('2026-01-05'), NOW);
		expect(tested).toMatchObject({ months: 48, said: '4 years', due: false });
		expect(tested?.lookAgain.getUTCFullYear()).toBe(2028);
	});

	it.each([
		[0, 'under a month'],
		[1, '1 month'],
		[12, '1 year'],
		[25, '2 years 1 month']
	])('says %i months as %s', (months, said) => expect(monthsSaid(months)).toBe(said));
});
