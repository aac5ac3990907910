import { describe, expect, it } from 'vitest';
import { pullPlan, WorthError, type PullInput, type PullPart } from './index';

const part = (id: string, minutes: number, gainCents: number, more: Partial<PullPart> = {}) => ({
	...{ id, minutes, gainCents },
	...more
});
const plan = (parts: PullPart[], minutes: number | null = null, labourNow = 50) =>
	pullPlan({ parts, minutes, labourNow });
const said = ({ order }: ReturnType<typeof pullPlan>) =>
	order.map(({ id, keep }) => (keep ? id : `(${id})`)).join(' ');

const engine = [
	part('shroud', 6, 0),
	part('coil', 3, 900, { behind: ['shroud'], keepMinutes: 4 }),
	part('flywheel', 10, 1500, { behind: ['shroud'], keepMinutes: 4 }),
	part('tank', 5, 1200, { keepMinutes: 4 }),
	part('bracket', 7, 100)
];

describe('a pull plan', () => {
	it('takes access off for what it opens, best per minute first, and stops at what does not pay', () => {
		const told = plan(engine);
		expect(said(told)).toBe('tank (shroud) coil flywheel');
		expect(told.minutes).toBe(9 + 6 + 7 + 14);
		expect(told.totalCents).toBe(1200 + 900 + 1500 - 36 * 50);
		expect(told.order.map(({ runningMinutes }) => runningMinutes)).toEqual([9, 15, 22, 36]);
		expect(told.order.map(({ runningCents }) => runningCents)).toEqual([750, 450, 1000, 1800]);
		expect(told.below).toEqual([{ id: 'bracket', minutes: 7, totalCents: 100 - 350 }]);
	});

	it('fits the minutes at hand', () => {
		expect(said(plan(engine, 30))).toBe('tank (shroud) flywheel');
		expect(said(plan(engine, 15))).toBe('tank');
		expect(said(plan(engine, 8))).toBe('');
		expect(plan(engine, 15).below).toContainEqual({
			...{ id: 'coil', minutes: 6 + 3 + 4, totalCents: 900 - 13 * 50 }
		});
	});

	it('answers a rush with less', () => {
		expect(said(plan(engine, null, 100))).toBe('tank');
		expect(said(plan(engine, null, 140))).toBe('');
	});

	it('keeps the whole or its pieces', () => {
		const starter = part('starter', 12, 3000);
		const pieces = (gain: number) => [
			part('drive', 5, gain, { partOf: 'starter' }),
			part('brushes', 3, gain, { partOf: 'starter' })
		];
		expect(said(plan([starter, ...pieces(1000)]))).toBe('starter');
		expect(said(plan([starter, ...pieces(2500)]))).toBe('(starter) brushes drive');
	});

	it('a piece that comes off first need not wait for its whole', () => {
		const head = part('head', 12, 400, { behind: ['cover'] });
		expect(said(plan([head, part('cover', 4, 700, { partOf: 'head' })]))).toBe('cover');
	});

	// common practice, no source: a wheel rusted to its shaft
	it('does not keep what has to be sacrificed', () => {
		const shaft = part('shaft', 4, 2500, { behind: ['wheel'], ruins: [] });
		const wheel = part('wheel', 10, 1500, { ruins: ['shaft'] });
		const told = plan([wheel, shaft]);
		expect(said(told)).toBe('wheel');
		expect(told.below).toEqual([{ id: 'shaft', minutes: 4, totalCents: -200 }]);
		const cut = plan([{ ...wheel, ruins: ['wheel'] }, shaft]);
		expect(said(cut)).toBe('wheel shaft');
		expect(said(plan([part('rim', 3, 900, { ruins: ['shaft'] }), { ...shaft, behind: [] }]))).toBe(
			'shaft'
		);
	});

	it('says what a further part would spoil', () => {
		const told = plan([part('rim', 3, 900, { ruins: ['shaft'] }), part('shaft', 4, 2500)]);
		expect(told.below).toEqual([{ id: 'rim', minutes: 3, totalCents: 900 - 150 - 2500 }]);
	});

	it('parts that stand before each other come off together', () => {
		const ring = [part('a', 3, 0, { behind: ['b'] }), part('b', 2, 900, { behind: ['a'] })];
		expect(plan(ring)).toMatchObject({ minutes: 5, totalCents: 650 });
		expect(said(plan(ring, 4))).toBe('');
	});

	it('of equal totals takes fewer minutes, and nothing rather than nothing gained', () => {
		expect(said(plan([part('even', 4, 200)]))).toBe('');
		expect(said(plan([part('slow', 10, 900), part('quick', 2, 500)], 11))).toBe('quick');
	});

	it('an empty donor has an empty plan; what is not there is not in the way', () => {
		expect(plan([])).toEqual({ order: [], minutes: 0, totalCents: 0, below: [] });
		const lone = part('coil', 3, 900, { behind: ['shroud'], partOf: 'ignition', ruins: ['x'] });
		expect(said(plan([lone]))).toBe('coil');
	});

	it.each([
		[{ labourNow: -1 }, 'labourNow'],
		[{ minutes: NaN }, 'minutes'],
		[{ parts: 'all' }, 'parts'],
		[{ parts: [part('a', -1, 0)] }, 'parts[0].minutes'],
		[{ parts: [part('a', 1, 0), part('b', 1, Infinity)] }, 'parts[1].gainCents'],
		[{ parts: [part('a', 1, 0, { keepMinutes: -4 })] }, 'parts[0].keepMinutes'],
		[{ parts: [part('a', 1, 0), part('a', 1, 0)] }, 'parts[1].id'],
		[{ parts: [{ ...part('a', 1, 0), behind: 'b' }] }, 'parts[0].behind'],
		[{ parts: [{ ...part('a', 1, 0), partOf: 3 }] }, 'parts[0].partOf'],
		[{ parts: [null] }, 'parts[0].id']
	])('refuses %j by name', (wrong, field) => {
		const bad = { parts: [], labourNow: 50, ...wrong } as unknown as PullInput;
		expect(() => pullPlan(bad)).toThrow(WorthError);
		expect(() => pullPlan(bad)).toThrow(expect.objectContaining({ field }));
	});
});

/** Best total for every limit by the textbook table of a knapsack, for parts that stand alone. */
function knapsack(parts: PullPart[], limit: number, labour: number): number {
	const best = new Array<number>(limit + 1).fill(0);
	for (const { minutes, gainCents } of parts)
		for (let left = limit; left >= minutes; left -= 1)
			best[left] = Math.max(best[left]!, best[left - minutes]! + gainCents - labour * minutes);
	return best[limit]!;
}

// Dantzig 1957, "Discrete-Variable Extremum Problems"; Bellman 1957, "Dynamic Programming"
describe('sixty parts that stand alone', () => {
	it('equal the table of a knapsack', () => {
		let seed = 12345;
		const draw = (most: number) => (seed = (seed * 16_807) % 2_147_483_647) % most;
		for (let donor = 0; donor < 12; donor += 1) {
			const parts = Array.from({ length: 60 }, (_each, at) => {
				const minutes = 1 + draw(18);
				// half the donors: money almost in step with minutes, the hard case
				return part(`${at}`, minutes, donor % 2 ? minutes * 90 + draw(80) : draw(4000));
			});
			for (const limit of [15, 60, 240])
				expect(plan(parts, limit).totalCents).toBe(knapsack(parts, limit, 50));
		}
	});
});
