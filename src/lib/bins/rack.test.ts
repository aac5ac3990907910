import { describe, expect, it } from 'vitest';
import { readAddress } from './address';
import { drawRacks } from './rack';
import type { BinItem } from './view';

const bin = (typed: string, id: number): BinItem => ({
	id,
	tag: `T${id}`,
	rack: null,
	shelf: null,
	slot: null,
	size: 's',
	litres: null,
	loadKg: null,
	uses: [],
	kinds: [],
	room: { holds: 12, litres: 0, grams: 0, fullness: 0, flags: [] },
	yearlyCostCents: null,
	purpose: '',
	place: '',
	red: false,
	version: 1,
	parts: 0,
	...readAddress(typed)
});

describe('racks', () => {
	const bins = ['K1-1', 'K3-3', 'K3-1', 'B1-1', 'under the bench', 'K2-200'].map(bin);
	const { racks, loose } = drawRacks(bins);

	it('stand by name, the top shelf first', () => {
		expect(racks.map((rack) => rack.name)).toEqual(['B', 'K']);
		expect(racks[1]?.shelves.map(({ shelf }) => shelf)).toEqual([3, 2, 1]);
	});

	it('show a missing slot as a gap', () => {
		expect(racks[1]?.shelves[0]?.bins.map((one) => one?.address)).toEqual([
			'K3-1',
			undefined,
			'K3-3'
		]);
	});

	it('do not draw two hundred empty slots for one far bin', () => {
		expect(racks[1]?.shelves[1]?.bins.map((one) => one?.address)).toEqual(['K2-200']);
	});

	it('leave out what has another kind of address', () => {
		expect(loose.map((one) => one.address)).toEqual(['UNDER THE BENCH']);
	});
});
