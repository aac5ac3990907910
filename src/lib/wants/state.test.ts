import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	canMove,
	isOpen,
	looksOut,
	WANT_MOVES,
	wantNumber,
	wantSaid,
	type WantMove
} from './state';
import { WANT_STATES, type WantState } from './words';

const moves = Object.keys(WANT_MOVES) as WantMove[];

describe('a want', () => {
	it('goes from waiting over told to a yes, a no or quiet, and may wait on from anywhere else', () => {
		expect(moves.filter((move) => canMove(move, 'waiting'))).toEqual([
			...['tell', 'yes', 'no', 'close', 'take off']
		]);
		for (const state of WANT_STATES) expect(canMove('wait on', state)).toBe(state !== 'waiting');
		expect(canMove('quiet', 'told')).toBe(true);
		expect(canMove('quiet', 'waiting')).toBe(false);
		expect(canMove('tell', 'said no')).toBe(false);
	});

	it('is never lost: whatever is done, it can wait again or waits', () => {
		const some = fc.array(fc.constantFrom(...moves), { maxLength: 20 });
		fc.assert(
			fc.property(some, (done) => {
				let state: WantState = 'waiting';
				for (const move of done) if (canMove(move, state)) state = WANT_MOVES[move].to;
				expect(state === 'waiting' || canMove('wait on', state)).toBe(true);
				expect(isOpen(state)).toBe(!['said no', 'got it', 'taken off'].includes(state));
			})
		);
	});

	it('is looked out for until something is kept for it', () => {
		expect(looksOut({ state: 'said yes', partId: null })).toBe(true);
		expect(looksOut({ state: 'said yes', partId: 4 })).toBe(false);
		expect(looksOut({ state: 'gone quiet', partId: null })).toBe(false);
	});

	it('is called by its number', () => {
		fc.assert(
			fc.property(fc.integer({ min: 1, max: 999_999_999 }), (number) => {
				expect(wantNumber(wantSaid(number))).toBe(number);
			})
		);
		for (const typed of ['', 'W0', 'D12', 'W', '1e3']) expect(wantNumber(typed)).toBeNull();
	});
});
