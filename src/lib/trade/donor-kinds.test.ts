import { describe, expect, it } from 'vitest';
import {
	accessOrder,
	isSafeToStore,
	kind,
	kinds,
	kindsOn,
	minutesToPull,
	SAFE_TICKS,
	standsBefore
} from './index';

const ids = (...args: Parameters<typeof kindsOn>) => kindsOn(...args).map((each) => each.id);

describe('the kinds on a donor', () => {
	it('follow from class and fittings', () => {
		const rider = ids('R2', ['12 V start', 'charging', 'two cylinders']);
		expect(rider).toEqual(expect.arrayContaining(['starter12', 'stator', 'eclutch', 'hydro']));
		expect(rider).not.toContain('recoil');
		expect(rider).not.toContain('carb-diaph');
		const mower = ids('WB', ['recoil']);
		expect(mower).toEqual(expect.arrayContaining(['recoil', 'recoil-kit', 'brake', 'cup']));
		for (const id of ['starter12', 'drive', 'solenoid', 'stator']) expect(mower).not.toContain(id);
		expect(ids('SN', ['recoil', 'mains start'])).toContain('starter120');
		expect(ids('SN', ['recoil'])).not.toContain('starter120');
	});

	it('always have the recoil on saws and trimmers', () => {
		expect(ids('SA', [])).toContain('recoil');
		expect(ids('TR', [])).toContain('recoil');
		expect(ids('GP', [])).not.toContain('recoil');
	});

	it('come with the best promise first and what is never kept last', () => {
		const on = kindsOn('R1', ['12 V start', 'charging']);
		const never = on.findIndex((each) => each.reuse === 'never');
		expect(on.slice(never).every((each) => each.reuse === 'never')).toBe(true);
		const worth = on
			.slice(0, never)
			.map((each) => each.callsPerYear * (each.newLowCents + each.newHighCents));
		expect(worth).toEqual([...worth].sort((a, b) => b - a));
	});
});

describe('getting at a part', () => {
	it('counts what still stands before it, and nothing that is gone', () => {
		expect(minutesToPull('coil', ['coil'])).toBe(3);
		expect(minutesToPull('coil', ['coil', 'shroud'])).toBe(9);
		expect(minutesToPull('coil', ['coil', 'shroud', 'fuel-tank'])).toBe(15);
		expect(minutesToPull('coil', ['coil', 'fuel-tank'])).toBe(3);
		const on = ids('WB', ['recoil']);
		expect(minutesToPull('carb-float', on)).toBe(8 + 2 + 1);
	});

	it('counts nothing twice', () => {
		const on = ids('R2', ['12 V start', 'charging']);
		const before = standsBefore('crank', on);
		expect(new Set(before).size).toBe(before.length);
		expect(minutesToPull('crank', on)).toBe(
			before.reduce((sum, id) => sum + kind(id).pullMinutes, kind('crank').pullMinutes)
		);
	});

	it('puts what stands before a part before it, for all kinds at once', () => {
		const order = accessOrder(kinds.map((each) => each.id));
		expect(order.length).toBe(kinds.length);
		for (const each of kinds) {
			for (const before of each.behind) {
				expect(order.indexOf(before), `${before} before ${each.id}`).toBeLessThan(
					order.indexOf(each.id)
				);
			}
		}
	});
});

describe('safe to store', () => {
	it('needs every tick, and each has its caution', () => {
		const all = SAFE_TICKS.map((tick) => tick.id);
		expect(isSafeToStore(all)).toBe(true);
		for (const missing of all) {
			expect(isSafeToStore(all.filter((id) => id !== missing))).toBe(false);
		}
		expect(SAFE_TICKS.every((tick) => tick.caution.length > 30)).toBe(true);
	});
});
