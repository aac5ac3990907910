import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	canHold,
	canSell,
	canShelve,
	canTakeBack,
	isMove,
	leads,
	MOVES,
	replay,
	undone,
	type Move,
	type Step
} from './state';
import { PART_STATES, type PartState } from './words';

const moves = Object.keys(MOVES) as Move[];
const froms = [null, ...PART_STATES];

/** Everything that may follow from a state, an undo of the newest step included. */
function mayFollow(state: PartState | null, newest: Step | undefined): Step[] {
	const steps = moves.flatMap((what) =>
		PART_STATES.filter((to) => leads(what, state, to)).map((toState) => ({
			what: what as string,
			fromState: state,
			toState
		}))
	);
	if (newest && newest.what !== 'undo')
		steps.push({
			what: 'undo',
			fromState: state,
			toState: undone(newest.fromState as PartState | null)
		});
	return steps;
}

/** A life of a part, drawn step by step from what may follow. */
function life(choices: number[]): { steps: Step[]; state: PartState | null } {
	const steps: Step[] = [];
	let state: PartState | null = null;
	for (const choice of choices) {
		const open = mayFollow(state, steps.at(-1));
		const step = open[choice % open.length];
		if (!step) break;
		steps.push(step);
		state = step.toState as PartState;
	}
	return { steps, state };
}

const choices = fc.array(fc.nat({ max: 10_000 }), { maxLength: 40 });

describe('replay', () => {
	it('gives the state of any life', () => {
		fc.assert(
			fc.property(choices, (drawn) => {
				const { steps, state } = life(drawn);
				expect(replay(steps)).toBe(state);
			})
		);
	});

	it('finds a step that was slipped in or left out', () => {
		fc.assert(
			fc.property(choices, fc.nat(), (drawn, at) => {
				const { steps } = life(drawn);
				const changing = steps.flatMap((step, place) =>
					step.fromState !== step.toState && place < steps.length - 1 ? [place] : []
				);
				const place = changing[at % Math.max(1, changing.length)];
				if (place === undefined) return;
				expect(() => replay(steps.toSpliced(place, 1))).toThrow('cannot lead');
			})
		);
	});

	it('refuses every arrow that the table does not have', () => {
		for (const what of moves)
			for (const from of froms)
				for (const to of PART_STATES) {
					if (leads(what, from, to)) continue;
					expect(() =>
						replay([
							...(from === null ? [] : [{ what: 'pull', fromState: null, toState: from }]),
							{ what, fromState: from, toState: to }
						])
					).toThrow('cannot lead');
				}
	});

	it('knows no other words than its own', () => {
		expect(isMove('toString')).toBe(false);
		expect(() => replay([{ what: 'polish', fromState: null, toState: 'pulled' }])).toThrow();
	});
});

describe('what the rules say', () => {
	const coil = { kind: 'coil', doubtful: false } as const;

	it('holds what is here, and says why not otherwise', () => {
		expect(canHold({ ...coil, state: 'shelved' })).toBe(true);
		expect(canHold({ ...coil, state: 'pulled' })).toBe(true);
		expect(canHold({ ...coil, state: 'held' })).toBe('It is held for somebody.');
		expect(canHold({ ...coil, state: 'out' })).toContain('out');
		expect(canHold({ ...coil, state: 'back' })).toContain('red bin');
		expect(canHold({ ...coil, state: 'missing' })).toContain('missing');
		expect(canHold({ ...coil, state: 'scrapped' })).toContain('scrapped');
	});

	it('sells no part that may only be fitted here', () => {
		expect(canSell({ kind: 'brake', doubtful: false, state: 'shelved' })).toContain('never sold');
		expect(canSell({ kind: 'flywheel', doubtful: false, state: 'shelved' })).toBe(true);
	});

	it('lets nothing doubtful onto a shelf', () => {
		expect(canShelve({ ...coil, state: 'back', doubtful: true })).toContain('red bin');
		expect(canShelve({ ...coil, state: 'back', doubtful: false })).toBe(true);
	});

	it('takes back only what is out', () => {
		expect(canTakeBack({ ...coil, state: 'out' })).toBe(true);
		expect(canTakeBack({ ...coil, state: 'shelved' })).toBe('It is on the shelf.');
	});
});
