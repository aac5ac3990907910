import type { WantState } from './words';

const SAID: Record<string, string> = {
	added: 'Put on the list',
	edited: 'Changed',
	yes: 'Said yes',
	no: 'Said no',
	close: 'Got it',
	'take off': 'Taken off the list',
	'wait on': 'Waits on',
	quiet: 'Gone quiet: no answer',
	seen: 'Looked at what is here',
	'not this': 'Not this one',
	'this after all': 'This one after all',
	'hold ended': 'The part is not kept any more',
	undo: 'Undone',
	erased: 'Customer deleted'
};

interface Happened {
	what: string;
	detail: Record<string, unknown>;
}

/** What happened to a want, in words. */
export function happened({ what, detail }: Happened): string {
	if (what === 'tell')
		return `Told ${detail.by === 'e-mail' ? 'by e-mail' : detail.by === 'in person' ? 'in person' : `by ${String(detail.by)}`}${detail.byItself ? ', by itself' : ''}`;
	const tag = typeof detail.tag === 'string' ? `: ${detail.tag}` : '';
	return `${SAID[what] ?? what}${tag}`;
}

const UNDOABLE = ['tell', 'yes', 'no', 'close', 'take off', 'wait on', 'not this', 'seen'];

/** Whether the newest event can be taken back; a letter that left cannot be called back, what it changed can. */
export const mayUndo = (what: string): boolean => UNDOABLE.includes(what);

export interface Before {
	state: WantState;
	toldAt: string | null;
	toldBy: string | null;
}
