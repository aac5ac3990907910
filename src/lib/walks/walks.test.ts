import { describe, expect, it } from 'vitest';
import { readAddress } from '../bins/address';
import { binsToCount } from './count';
import { kilosByClass } from './kilos';
import { whyPurge, type OnShelf } from './purge';
import { redNext } from './red';

const NOW = new Date('2026-03-14T12:00:00Z');
const ago = (months: number) => new Date(NOW.getTime() - months * 30.5 * 24 * 3600 * 1000);

describe('a purge', () => {
	const part = (more: Partial<OnShelf> = {}): OnShelf => ({
		state: 'shelved',
		place: 2,
		have: 3,
		pulledAt: ago(40),
		lastCall: null,
		verdict: 'keep',
		waiting: false,
		noLongerMade: false,
		keptAt: null,
		...more
	});

	it('lists what nobody called for in 24 months where a better one lies beside it', () => {
		expect(whyPurge(part(), NOW)).toBe('no call in 24 months, 3 of the same');
		expect(whyPurge(part({ lastCall: ago(30) }), NOW)).toBe(
			'last call 30 months ago, 3 of the same'
		);
	});

	it.each<[string, Partial<OnShelf>]>([
		['the first in the queue, which stays', { place: 1 }],
		['the only one', { have: 1, place: 1 }],
		['what was called for lately', { lastCall: ago(20) }],
		['what has not lain there for 24 months', { pulledAt: ago(20) }],
		['what is no longer made', { noLongerMade: true, verdict: 'let it go' }],
		['what somebody waits for', { waiting: true, verdict: 'let it go' }],
		['what is held', { state: 'held', verdict: 'let it go' }],
		['what is missing', { state: 'missing' }],
		['what was kept at the last purge', { keptAt: ago(3) }]
	])('leaves out %s', (_what, more) => expect(whyPurge(part(more), NOW)).toBeNull());

	it('lists what is not worth its place however young it is', () => {
		const young = { pulledAt: ago(1), have: 1, place: 1 };
		expect(whyPurge(part({ ...young, verdict: 'let it go' }), NOW)).toBe('not worth its place');
		expect(whyPurge(part({ ...young, verdict: 'close call' }), NOW)).toBeNull();
	});

	it('asks again half a year after it was kept', () => {
		expect(whyPurge(part({ keptAt: ago(7) }), NOW)).not.toBeNull();
	});
});

describe('a count', () => {
	const bin = (address: string, lastCounted: Date | null) => ({
		...{ rack: null, shelf: null, slot: null },
		...readAddress(address),
		lastCounted
	});

	it('takes the bins not counted for longest, never first, in walking order', () => {
		const bins = [
			bin('K1-1', ago(1)),
			bin('K1-2', null),
			bin('K2-1', ago(9)),
			bin('A1-1', ago(3)),
			bin('K2-2', null)
		];
		expect(binsToCount(bins, 3).map((one) => one.address)).toEqual(['K1-2', 'K2-2', 'K2-1']);
	});

	it('takes neighbours where none was ever counted', () => {
		const bins = Array.from({ length: 30 }, (_, at) => bin(`A1-${30 - at}`, null));
		expect(binsToCount(bins).map((one) => one.address)).toEqual(
			Array.from({ length: 10 }, (_, at) => `A1-${at + 1}`)
		);
	});
});

describe('kilos by scrap class', () => {
	it('count weighed parts as weighed, others at the middle of their kind', () => {
		const rows = kilosByClass([
			{ kind: 'crank', grams: 4000 },
			{ kind: 'cam', grams: null },
			{ kind: 'starter12', grams: 2000 }
		]);
		expect(rows).toMatchObject([
			{ scrapClass: 'Fe-H', parts: 2, grams: 4650, cents: 140 },
			{ scrapClass: 'Cu-M', parts: 1, grams: 2000, cents: 115 }
		]);
	});

	it("go by the yard's own price", () => {
		expect(kilosByClass([{ kind: 'crank', grams: 2000 }], { 'Fe-H': 50 })[0]?.cents).toBe(100);
	});
});

describe('what to do with a part in the red bin', () => {
	it('is a test where nobody tested it since it came back', () => {
		expect(redNext({ kind: 'coil', verdict: 'keep', failed: false }).next).toBe('test');
	});
	it('is a rebuild where it failed and there is a kit', () => {
		expect(redNext({ kind: 'carb-float', verdict: 'keep', failed: true }).next).toBe('rebuild');
	});
	it('is scrap where it failed without a kit, or another test does not pay', () => {
		expect(redNext({ kind: 'coil', verdict: 'keep', failed: true }).next).toBe('scrap');
		expect(redNext({ kind: 'coil', verdict: 'let it go', failed: false }).next).toBe('scrap');
	});
	it('is destroying for a safety part that failed', () => {
		const { next, why } = redNext({ kind: 'flywheel', verdict: 'keep', failed: true });
		expect([next, why]).toEqual(['scrap', 'A safety part that failed is destroyed.']);
	});
});
