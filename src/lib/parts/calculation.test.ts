import { describe, expect, it } from 'vitest';
import { askedIn } from './calculation';

const asked = (address: string) => askedIn(new URLSearchParams(address), 'USD');

describe('what the calculator is asked', () => {
	it('is nothing before anything was sent', () => {
		expect(asked('')).toEqual({ asked: null, problems: [] });
	});

	it('a kind alone: unknown cause, untested, none there yet, no price', () => {
		expect(asked('kind=starter12&new=&copy=&cause=&have=').asked).toEqual({
			kind: 'starter12',
			cause: 'unknown',
			grade: 'untested',
			newCents: null,
			copyCents: null,
			have: 0,
			stillOn: false,
			season: null
		});
	});

	it('everything as typed', () => {
		const address =
			'kind=coil&cause=no-oil&grade=good+used&new=$136&copy=58,50&have=2&where=on&season=rush';
		expect(asked(address).asked).toEqual({
			kind: 'coil',
			cause: 'no-oil',
			grade: 'good used',
			newCents: 13_600,
			copyCents: 5850,
			have: 2,
			stillOn: true,
			season: 'rush'
		});
	});

	it.each([
		['kind=', 'kind', 'Choose what kind of part it is'],
		['kind=gearbox', 'kind', 'Choose a kind from the list'],
		['kind=coil&new=0', 'new', 'Enter “Price of a new one” as an amount above 0, like 46 or 46.50'],
		['kind=coil&have=-1', 'have', 'Enter how many there are, 0 or more'],
		['kind=coil&have=some', 'have', 'Enter how many there are as a whole number'],
		['kind=coil&cause=rust', 'cause', 'Choose the cause of death from the list']
	])('%s: says what to put right', (address, field, message) => {
		const { asked: read, problems } = asked(address);
		expect(read).toBeNull();
		expect(problems).toEqual([{ field, message }]);
	});
});
