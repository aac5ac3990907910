import type { WantState } from './words';

export const WANT_MOVES = {
	/** They are told that something is here. */
	tell: { from: ['waiting', 'told', 'gone quiet'], to: 'told' },
	yes: { from: ['waiting', 'told', 'gone quiet'], to: 'said yes' },
	no: { from: ['waiting', 'told', 'said yes', 'gone quiet'], to: 'said no' },
	/** They have it; nobody waits any more. */
	close: { from: ['waiting', 'told', 'said yes', 'gone quiet'], to: 'got it' },
	/** The shop gives it up. */
	'take off': { from: ['waiting', 'told', 'said yes', 'gone quiet'], to: 'taken off' },
	/** Told so long ago without an answer. */
	quiet: { from: ['told'], to: 'gone quiet' },
	'wait on': {
		from: ['told', 'said yes', 'said no', 'gone quiet', 'got it', 'taken off'],
		to: 'waiting'
	}
} as const satisfies Record<string, { from: readonly WantState[]; to: WantState }>;
export type WantMove = keyof typeof WANT_MOVES;

/** Whether this can be done with a want as it stands. */
export const canMove = (move: WantMove, state: WantState): boolean =>
	(WANT_MOVES[move].from as readonly WantState[]).includes(state);

/** They still wait, or wait for the day they fetch it. */
export const isOpen = (state: WantState): boolean => canMove('close', state);

/** It is looked out for: what comes in is compared with it. */
export const looksOut = ({ state, partId }: { state: WantState; partId: number | null }): boolean =>
	(state === 'waiting' || state === 'told' || state === 'said yes') && partId === null;

const STATE_SAID: Record<WantState, string> = {
	waiting: 'Waiting',
	told: 'Told',
	'said yes': 'Said yes',
	'said no': 'Said no',
	'gone quiet': 'Gone quiet',
	'got it': 'Got it',
	'taken off': 'Taken off the list'
};

export const stateSaid = (state: WantState): string => STATE_SAID[state];

export const wantSaid = (number: number): string => `W${number}`;

/** W12, w12 or 12 as its number; null when it is none. */
export function wantNumber(typed: string): number | null {
	const found = /^w?([1-9]\d{0,8})$/i.exec(typed.trim());
	return found ? Number(found[1]) : null;
}
