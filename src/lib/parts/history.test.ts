import { expect, it } from 'vitest';
import { happened, mayUndo } from './history';
import { MOVES } from './state';

const said = (what: string, detail: Record<string, unknown> = {}, toState = 'shelved') =>
	happened({ what, toState, detail });

it('says what happened in words', () => {
	expect(said('pull', { grade: 'good used', to: 'K3-1' })).toBe('Logged as good used, put in K3-1');
	expect(said('pull', { reason: 'cracked' }, 'scrapped')).toBe('Logged and scrapped: cracked');
	expect(said('move', { to: 'R1' }, 'back')).toBe('Moved to R1 (red bin)');
	expect(said('prove', { how: 'bench test hot', passed: true, figure: '10.5 kV' })).toBe(
		'Bench test hot: passed, 10.5 kV'
	);
	expect(said('free', { expired: true })).toBe('The hold ran out');
	expect(said('undo', { said: 'Moved to K3-1' })).toBe('Undone: Moved to K3-1');
});

it('has words for every move', () => {
	for (const what of Object.keys(MOVES)) expect(said(what)).not.toBe(what);
});

it('takes back neither proofs nor photos nor an undo', () => {
	expect(Object.keys(MOVES).filter((what) => !mayUndo(what))).toEqual(['photo', 'prove']);
	expect(mayUndo('undo')).toBe(false);
});
