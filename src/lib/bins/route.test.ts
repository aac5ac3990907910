import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readAddress } from './address';
import { walkingOrder, type Standing } from './route';

const at = (address: string, place = ''): Standing => ({
	rack: null,
	shelf: null,
	slot: null,
	place,
	...readAddress(address)
});
const route = (...addresses: string[]) =>
	walkingOrder(addresses.map((one) => at(one))).map((one) => one.address);

describe('walking order', () => {
	it('goes to and fro along the shelves of a rack, from the floor up', () => {
		expect(route('K2-1', 'K1-2', 'K1-1', 'K3-1', 'K2-2', 'K3-2')).toEqual(
			'K1-1 K1-2 K2-2 K2-1 K3-1 K3-2'.split(' ')
		);
	});

	it('turns only where there is something to look at', () => {
		expect(route('K1-1', 'K1-9', 'K4-1', 'K4-9')).toEqual('K1-1 K1-9 K4-9 K4-1'.split(' '));
	});

	it('goes rack after rack by name, and last to what is in no rack', () => {
		expect(route('under the bench', 'M1-1', 'K1-10', 'K1-2')).toEqual([
			'K1-2',
			'K1-10',
			'M1-1',
			'UNDER THE BENCH'
		]);
	});

	const anyPlace = fc.oneof(
		fc
			.tuple(fc.constantFrom('A', 'B', 'MEZZ'), fc.integer({ min: 1, max: 5 }), fc.nat(8))
			.map(([rack, shelf, slot]) => at(`${rack}${shelf}-${slot + 1}`)),
		fc.constantFrom('yard', 'door', 'loft').map((one) => at(`${one} corner`, one))
	);
	const anyPlaces = fc.uniqueArray(anyPlace, { selector: (one) => one.address, maxLength: 40 });

	it('visits every place once', () => {
		fc.assert(
			fc.property(anyPlaces, (places) => {
				const walked = walkingOrder(places);
				expect([...walked].sort(byName)).toEqual([...places].sort(byName));
			})
		);
	});

	it('is the same whatever order they are read in', () => {
		fc.assert(
			fc.property(anyPlaces, (places) => {
				expect(walkingOrder(places.toReversed())).toEqual(walkingOrder(places));
			})
		);
	});

	it('enters each rack and each shelf once, and turns at the end of every shelf', () => {
		fc.assert(
			fc.property(anyPlaces, (places) => {
				const walked = walkingOrder(places).filter((one) => one.rack !== null);
				const shelves = walked.map((one) => `${one.rack} ${one.shelf}`);
				const entered = shelves.filter((one, i) => one !== shelves[i - 1]);
				expect(new Set(entered).size).toBe(entered.length);
				const racks = entered.map((one) => one.split(' ')[0]);
				expect(racks).toEqual([...racks].sort());
				const seen = new Map<string, number>();
				for (const shelf of entered) {
					const rack = shelf.split(' ')[0]!;
					const turn = seen.get(rack) ?? 0;
					seen.set(rack, turn + 1);
					const slots = walked
						.filter((one) => `${one.rack} ${one.shelf}` === shelf)
						.map((one) => one.slot!);
					const up = [...slots].sort((a, b) => a - b);
					expect(slots).toEqual(turn % 2 === 0 ? up : up.reverse());
				}
			})
		);
	});
});

const byName = (a: Standing, b: Standing) => (a.address < b.address ? -1 : 1);
