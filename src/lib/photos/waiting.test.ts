import fc from 'fast-check';
import { expect, it } from 'vitest';
import { fateOf, pauseMs, targetOf } from './waiting';

const chance = fc.double({ min: 0, max: 1, noNaN: true });

it('waits longer after each try, never longer than six minutes', () => {
	fc.assert(
		fc.property(fc.integer({ min: 1, max: 60 }), chance, (tries, luck) => {
			const [now, next] = [pauseMs(tries, luck), pauseMs(tries + 1, luck)];
			expect(next).toBeGreaterThanOrEqual(now);
			expect(now).toBeGreaterThan(1000);
			expect(next).toBeLessThanOrEqual(6 * 60_000);
		})
	);
});

it('no signal and a lost session never make a photo fail, however often', () => {
	fc.assert(
		fc.property(fc.integer({ min: 1, max: 5000 }), chance, (tries, luck) => {
			expect(fateOf({ status: 0 }, tries, luck).what).toBe('later');
			expect(fateOf({ status: 401 }, tries, luck).what).toBe('later');
		})
	);
});

it('what another try cannot cure fails at once, in the words of the shop', () => {
	for (const status of [400, 403, 404, 409, 413, 422])
		expect(fateOf({ status, message: 'Too large' }, 1, 0)).toEqual({
			what: 'failed',
			said: 'Too large'
		});
});

it('a busy shop is asked again, after the pause it asks for, and not for ever', () => {
	for (const status of [408, 429, 500, 503]) {
		expect(fateOf({ status, after: 90 }, 1, 0)).toMatchObject({ what: 'later', after: 90_000 });
		expect(fateOf({ status }, 12, 0).what).toBe('failed');
	}
});

it('knows what an address belongs to', () => {
	expect(targetOf('/api/ours/donors/D12/photos', 'front')).toEqual({
		api: '/api/ours/donors/D12/photos',
		shot: 'front',
		about: 'Donor D12',
		page: '/ours/donors/D12'
	});
	expect(targetOf('/api/ours/parts/K7M3X/photos', '').about).toBe('Part K7M3X');
});
