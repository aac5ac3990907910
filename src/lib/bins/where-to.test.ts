import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kinds } from '../trade';
import { usualGrams, whyApart } from './nature';
import { fullness, flagsOf, holds, takes, usedGrams, usedLitres } from './room';
import { BIN_SIZES } from './size';
import { BIN_USES } from './use';
import { whereTo, whyNotInto, type Shelf } from './where-to';

const bin = (address: string, more: Partial<Shelf> = {}): Shelf => ({
	address,
	shelf: Number(/\d/.exec(address)?.[0] ?? 0) || null,
	size: 'm',
	litres: null,
	loadKg: null,
	uses: [],
	kinds: [],
	red: false,
	contents: [],
	...more
});
const held = (kind: string, count = 1, grams = 400 * count) => ({ kind, count, grams });
const first = (kind: string, bins: Shelf[], grams?: number) => whereTo({ kind, grams }, bins)[0];

describe('where to put a part', () => {
	it('is where its kind lies, before an empty bin', () => {
		const bins = [bin('A2-1'), bin('K2-1', { contents: [held('recoil', 3)] })];
		expect(first('recoil', bins)).toMatchObject({ address: 'K2-1', parts: 3 });
		expect(first('recoil', bins)?.why).toBe('3 of its kind, room for 23');
	});

	it('is the bin named for it where none of its kind lies anywhere', () => {
		const bins = [bin('A2-1'), bin('B2-1', { kinds: ['recoil'] })];
		expect(first('recoil', bins)).toMatchObject({ address: 'B2-1' });
		expect(first('recoil', bins)?.why).toContain('named for it');
	});

	it('is never a bin that is named for other kinds, or full, or red', () => {
		const bins = [
			bin('A2-1', { kinds: ['coil'] }),
			bin('A2-2', { litres: 1 }),
			bin('A2-3', { red: true })
		];
		expect(whereTo({ kind: 'recoil' }, bins)).toEqual([]);
	});

	it('is low for what is heavy: the floor before the hip, never above it', () => {
		const bins = [1, 2, 3, 4].map((shelf) => bin(`A${shelf}-1`, { size: 'xl' }));
		expect(whereTo({ kind: 'crank', grams: 5500 }, bins).map((one) => one.address)).toEqual([
			'A1-1',
			'A2-1'
		]);
		expect(first('crank', bins, 5500)?.why).toContain('heavy: on the floor');
		expect(whereTo({ kind: 'starter12', grams: 2000 }, bins, 9)).toHaveLength(3);
	});

	it('is not a bin that would carry too much', () => {
		const loaded = bin('A1-1', { size: 'xl', loadKg: 10, contents: [held('crank', 2, 8000)] });
		expect(whyNotInto(loaded, 'crank', 2500)).toBe('too heavy for what it may carry');
		expect(whyNotInto(loaded, 'crank', 1900)).toBeNull();
	});

	it('keeps what held fuel from electrics, and linings from oil', () => {
		const fuel = bin('A2-1', { contents: [held('carb-float')] });
		expect(whyNotInto(fuel, 'stator', 500)).toContain('fuel');
		expect(whyNotInto(bin('A2-2', { contents: [held('cam')] }), 'cclutch', 400)).toContain('oiled');
		expect(whyNotInto(bin('A2-3', { contents: [held('flywheel')] }), 'coil', 300)).toContain(
			'magnets'
		);
	});

	it('prefers a dry bin for what rusts and the fuel bin for what held fuel', () => {
		const bins = [bin('A2-1'), bin('B2-1', { uses: ['dry'] }), bin('C2-1', { uses: ['fuel'] })];
		expect(first('cam', bins)?.address).toBe('B2-1');
		expect(first('carb-float', bins)?.address).toBe('C2-1');
		expect(whereTo({ kind: 'carb-float' }, bins).map((one) => one.address)).not.toContain('B2-1');
	});

	it('does not put a stray kind among others that have nothing to do with it', () => {
		expect(whereTo({ kind: 'recoil' }, [bin('A2-1', { contents: [held('muffler')] })])).toEqual([]);
	});
});

const anyKind = fc.constantFrom(...kinds.map(({ id }) => id));
const anyBin = fc.record({
	address: fc.stringMatching(/^[A-Z][1-4]-[1-9]$/),
	shelf: fc.option(fc.integer({ min: 1, max: 5 })),
	size: fc.constantFrom(...BIN_SIZES),
	litres: fc.option(fc.integer({ min: 1, max: 200 })),
	loadKg: fc.option(fc.integer({ min: 1, max: 80 })),
	uses: fc.subarray([...BIN_USES]),
	kinds: fc.array(anyKind, { maxLength: 2 }),
	red: fc.boolean(),
	contents: fc.array(
		fc.record({
			kind: anyKind,
			count: fc.integer({ min: 1, max: 4 }),
			grams: fc.integer({ min: 1, max: 9000 })
		}),
		{ maxLength: 3 }
	)
});

describe('a suggestion', () => {
	it('always has room, may carry it, stands low enough and harms nothing', () => {
		fc.assert(
			fc.property(anyKind, fc.array(anyBin, { maxLength: 8 }), (kind, bins) => {
				const grams = usualGrams(kinds.find(({ id }) => id === kind)!);
				const named = bins.map((one, at) => ({ ...one, address: `${one.address}/${at}` }));
				for (const { address } of whereTo({ kind }, named, 99)) {
					const to = named.find((one) => one.address === address)!;
					expect(to.red).toBe(false);
					expect(usedLitres(to) + takes(kind)).toBeLessThanOrEqual(holds(to) + 1e-6);
					expect(usedGrams(to) + grams).toBeLessThanOrEqual((to.loadKg ?? Infinity) * 1000);
					expect(grams >= 5000 && (to.shelf ?? 0) > 2).toBe(false);
					expect(to.contents.every((one) => whyApart(kind, one.kind) === null)).toBe(true);
				}
			})
		);
	});

	it('does not hang on the order in which the bins are read', () => {
		fc.assert(
			fc.property(
				anyKind,
				fc.uniqueArray(anyBin, { maxLength: 6, selector: (one) => one.address }),
				(kind, bins) => {
					expect(whereTo({ kind }, bins)).toEqual(whereTo({ kind }, bins.toReversed()));
				}
			)
		);
	});

	it('keeps kinds apart the same either way round', () => {
		fc.assert(
			fc.property(anyKind, anyKind, (a, b) => {
				expect(whyApart(a, b)).toBe(whyApart(b, a));
			})
		);
	});
});

describe('the flags of a bin', () => {
	const flags = (more: Partial<Shelf>) => flagsOf(bin('A2-1', more)).map(({ flag }) => flag);

	it('say nothing of an empty one or of one kind with room', () => {
		expect(flags({})).toEqual([]);
		expect(flags({ contents: [held('recoil', 3)] })).toEqual([]);
	});

	it('say that it is full, by its litres or by what its size usually holds', () => {
		expect(flags({ litres: 3, contents: [held('recoil', 2)] })).toEqual(['full']);
		expect(flags({ contents: [held('recoil', 26)] })).toEqual(['full']);
		expect(fullness(bin('A2-1', { litres: 3, contents: [held('recoil', 1)] }))).toBe(0.5);
	});

	it('say that it carries too much', () => {
		expect(flags({ loadKg: 5, contents: [held('recoil', 4, 5200)] })).toEqual(['overweight']);
		expect(flags({ loadKg: 6, contents: [held('recoil', 4, 5200)] })).toEqual([]);
	});

	it('say that systems are mixed, and what should not lie together', () => {
		expect(flags({ contents: [held('recoil'), held('muffler')] })).toEqual(['mixed']);
		expect(flags({ contents: [held('stator'), held('carb-float')] })).toEqual(['apart']);
		expect(flags({ kinds: ['recoil'], contents: [held('cup')] })).toEqual(['mixed']);
		expect(flags({ kinds: ['recoil', 'muffler'], contents: [held('muffler')] })).toEqual([]);
	});

	it('leave the red bin as it comes', () => {
		expect(flags({ red: true, contents: [held('stator'), held('carb-float')] })).toEqual([]);
	});
});
