import { SAFE_TICKS } from '$lib/trade';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dayIn, sayDay } from './day';
import {
	afterMove,
	canPull,
	gatesShut,
	noMoveSaid,
	releaseGate,
	replay,
	type DonorMove
} from './state';
import { WANTED_SHOTS } from './shots';
import { todoOf } from './todo';
import { DONOR_STATES, type DonorState } from './words';

const TODAY = '2026-03-10';
const allSafe = SAFE_TICKS.map((tick) => tick.id);
const ready = { state: 'whole' as DonorState, cause: 'strike', safeTicks: allSafe };
const released = { holdUntil: null };

describe('the gates before stripping', () => {
	it('are open when the cause is named, the release there and all ticked', () => {
		expect(gatesShut(ready, released, TODAY)).toEqual([]);
	});

	it('say what opens each of them', () => {
		const bare = { state: 'whole' as const, cause: null, safeTicks: allSafe.slice(1) };
		const said = gatesShut(bare, null, TODAY).map((gate) => gate.said);
		expect(said).toEqual([
			'Record the release first: nobody has said yet that it may be taken apart.',
			'Name the cause of death first.',
			'Make it safe first: fuel out.'
		]);
	});

	it('stay shut until the hold date and open on it', () => {
		const held = { holdUntil: '2026-03-12' };
		expect(gatesShut(ready, held, '2026-03-11')[0]?.said).toBe(
			'Hold date is 12 March: not before then.'
		);
		expect(gatesShut(ready, held, '2026-03-12')).toEqual([]);
	});

	it('let the owner overrule the release and its date, nothing else', () => {
		const bare = { state: 'whole' as const, cause: null, safeTicks: [] };
		const can = (release: typeof released | null, holdUntil: string | null = null) =>
			gatesShut(bare, release && { holdUntil }, TODAY)
				.filter((gate) => gate.overrulable)
				.map((gate) => gate.gate);
		expect(can(null)).toEqual(['release']);
		expect(can(released, '2027-01-01')).toEqual(['hold']);
		expect(can(released)).toEqual([]);
	});

	it('do not take “not known yet” for a cause', () => {
		expect(gatesShut({ ...ready, cause: 'unknown' }, released, TODAY)).toHaveLength(1);
	});
});

describe('leaving', () => {
	it('needs the release and its hold date only, and the owner may have passed them', () => {
		const gates = (release: { holdUntil: string | null } | null, gateOverruled = false) =>
			releaseGate({ gateOverruled }, release, TODAY).map(({ gate }) => gate);
		expect(gates(null)).toEqual(['release']);
		expect(gates({ holdUntil: '2026-03-11' })).toEqual(['hold']);
		expect(gates({ holdUntil: TODAY })).toEqual([]);
		expect(gates(null, true)).toEqual([]);
	});
});

describe('pulling', () => {
	it('is open on the bench and on a parked donor whose release is in order', () => {
		expect(canPull({ ...ready, state: 'on the bench' }, null, TODAY)).toBe(true);
		expect(canPull({ ...ready, state: 'parked' }, released, TODAY)).toBe(true);
		expect(canPull({ ...ready, state: 'parked' }, null, TODAY)).toMatch(/Record the release/);
		expect(canPull({ ...ready, state: 'whole' }, released, TODAY)).toMatch(/Put it on the bench/);
	});
});

describe('a donor on its way', () => {
	const moves: DonorMove[] = ['strip', 'park', 'finish', 'reopen', 'scrap', 'sell'];

	it('never leaves its states, and its events replay to where it is', () => {
		fc.assert(
			fc.property(fc.array(fc.constantFrom(...moves)), (steps) => {
				let state: DonorState = 'whole';
				const events: { toState: string | null }[] = [{ toState: 'whole' }, { toState: null }];
				for (const step of steps) {
					const next = afterMove(state, step);
					if (next) events.push({ toState: (state = next) });
					else expect(noMoveSaid(state, step)).toContain(state);
				}
				expect(DONOR_STATES).toContain(state);
				expect(replay(events)).toBe(state);
			})
		);
	});

	it('stays gone', () => {
		for (const move of moves) expect(afterMove('gone', move)).toBeNull();
	});
});

describe('what is still to do', () => {
	it('nags until all is there and then is silent', () => {
		const bare = { state: 'whole' as const, cause: null, safeTicks: [] };
		expect(todoOf(bare, null, [], TODAY).map((one) => one.id)).toEqual([
			'release',
			'cause',
			'safe',
			'photos'
		]);
		expect(todoOf(ready, released, WANTED_SHOTS, TODAY)).toEqual([]);
	});

	it('names the views that are missing', () => {
		const [photos] = todoOf(ready, released, ['front', 'back', 'label', 'other'], TODAY);
		expect(photos?.said).toBe('Photos: PTO end, carburetor side, inside, or the failure');
	});

	it('is over once the donor is stripped', () => {
		expect(todoOf({ ...ready, cause: null, state: 'stripped' }, null, [], TODAY)).toEqual([]);
	});
});

describe('a day', () => {
	it('is the one of the shop, not of the server', () => {
		const late = new Date('2026-03-10T03:30:00Z');
		expect(dayIn('America/New_York', late)).toBe('2026-03-09');
		expect(dayIn('Europe/Berlin', late)).toBe('2026-03-10');
	});

	it('is said with its year when it is another one', () => {
		expect(sayDay('2026-03-12', TODAY)).toBe('12 March');
		expect(sayDay('2027-01-02', TODAY)).toBe('2 January 2027');
	});
});
