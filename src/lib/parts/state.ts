import { kind } from '../trade';
import { isMove, leads, MOVES, NEEDS, type Arrows, type Move } from './moves';
import type { PartState } from './words';

export { isMove, leads, MOVES, NEEDS, type Move };

/** What a rule needs to know about a part. */
export interface PartFacts {
	state: PartState;
	kind: string;
	/** It failed or came back and nothing has proved it since. */
	doubtful: boolean;
}

export interface No {
	code: 'taken' | 'gate';
	said: string;
}

const NOT_HERE: Record<PartState, string> = {
	pulled: 'It is not put away yet.',
	shelved: 'It is on the shelf.',
	held: 'It is held for somebody.',
	out: 'It is out: fitted or sold.',
	back: 'It lies in the red bin: prove it first, then move it to a bin.',
	scrapped: 'It was scrapped.',
	missing: 'It is missing: move it to a bin when it turns up.'
};

/** Why a move is shut, or null when it is open. Whether a bin is red is `whyNotShelf`'s business. */
export function whyNot(move: Move, part: PartFacts): No | null {
	const arrows: Arrows = MOVES[move];
	if (!arrows[part.state]) {
		return { code: part.state === 'back' ? 'gate' : 'taken', said: NOT_HERE[part.state] };
	}
	if (move === 'sell' && kind(part.kind).reuse === 'safety-own') {
		return { code: 'gate', said: `${kind(part.kind).name}: fitted in this shop only, never sold.` };
	}
	return null;
}

/** Why a part may not lie in an ordinary bin. */
export function whyNotShelf(part: PartFacts): No | null {
	if (!part.doubtful) return null;
	return {
		code: 'gate',
		said: 'It failed or came back. It goes to the red bin until a test is passed.'
	};
}

const can =
	(move: Move) =>
	(part: PartFacts): true | string =>
		whyNot(move, part)?.said ?? true;

export const canHold = can('hold');
export const canSell = can('sell');
export const canTakeBack = can('take back');
export const canShelve = (part: PartFacts): true | string => whyNotShelf(part)?.said ?? true;

/** Logged by mistake and undone at once: such a row stays as history, its kind is on the donor again. */
export const MISTAKE = 'logged by mistake';

/** The state a part goes to when its newest move is undone. */
export const undone = (from: PartState | null): PartState => from ?? 'scrapped';

export interface Step {
	what: string;
	fromState: string | null;
	toState: string | null;
}

/**
 * The state that a part's events lead to, oldest first; null before the first.
 * Throws where an event does not follow from the one before it.
 */
export function replay(events: readonly Step[]): PartState | null {
	let state: PartState | null = null;
	let before: Step | undefined;
	for (const event of events) {
		const to = event.toState as PartState;
		const follows =
			event.what === 'undo'
				? before !== undefined && to === undone(before.fromState as PartState | null)
				: isMove(event.what) && leads(event.what, state, to);
		if (event.fromState !== state || !follows) {
			throw new Error(`${event.what} cannot lead from ${state} to ${event.toState}`);
		}
		state = to;
		before = event;
	}
	return state;
}
