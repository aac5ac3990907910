import type { Ability } from '../people/role';
import type { PartState } from './words';

/** Before a part is logged it is nowhere. */
type From = PartState | 'none';

export type Arrows = Partial<Record<From, readonly PartState[]>>;

const HERE = ['pulled', 'shelved', 'held', 'back', 'missing'] as const;
const stays = (states: readonly PartState[]) =>
	Object.fromEntries(states.map((state) => [state, [state]])) as Partial<Record<From, PartState[]>>;

/** What may happen to a part: for every move, from which state to which. The one table. */
export const MOVES = {
	pull: { none: ['pulled', 'shelved', 'back', 'scrapped'] },
	move: {
		pulled: ['shelved', 'back'],
		shelved: ['shelved', 'back'],
		held: ['held'],
		back: ['back', 'shelved'],
		missing: ['shelved', 'back']
	},
	grade: stays(HERE),
	edit: stays([...HERE, 'out']),
	photo: stays([...HERE, 'out', 'scrapped']),
	prove: {
		pulled: ['pulled', 'back'],
		shelved: ['shelved', 'back'],
		held: ['held', 'back'],
		back: ['back']
	},
	clean: stays(HERE),
	hold: { pulled: ['held'], shelved: ['held'] },
	free: { held: ['pulled', 'shelved'] },
	fit: { pulled: ['out'], shelved: ['out'], held: ['out'] },
	sell: { pulled: ['out'], shelved: ['out'], held: ['out'] },
	'take back': { out: ['back'] },
	scrap: {
		pulled: ['scrapped'],
		shelved: ['scrapped'],
		held: ['scrapped'],
		back: ['scrapped'],
		missing: ['scrapped']
	},
	miss: { pulled: ['missing'], shelved: ['missing'], held: ['missing'], back: ['missing'] },
	find: { missing: ['pulled', 'shelved', 'back'] }
} satisfies Record<string, Arrows>;

export type Move = keyof typeof MOVES;

/** What a member must be allowed to make a move. */
export const NEEDS: Record<Move, Ability> = {
	pull: 'work',
	move: 'work',
	grade: 'work',
	edit: 'work',
	photo: 'work',
	prove: 'work',
	clean: 'work',
	hold: 'hold',
	free: 'hold',
	fit: 'hold',
	sell: 'trade',
	'take back': 'trade',
	scrap: 'work',
	miss: 'work',
	find: 'work'
};

export const isMove = (word: string): word is Move => Object.hasOwn(MOVES, word);

/** May this move lead from here to there? */
export function leads(move: Move, from: PartState | null, to: PartState): boolean {
	const arrows: Arrows = MOVES[move];
	return arrows[from ?? 'none']?.includes(to) ?? false;
}
