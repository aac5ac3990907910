import { isMove } from './state';

interface Happened {
	what: string;
	toState: string | null;
	detail: Record<string, unknown>;
}

const word = (value: unknown): string => (typeof value === 'string' ? value : '');
const after = (lead: string, value: unknown) => (word(value) ? `${lead}${word(value)}` : '');

const SAID: Record<string, (detail: Record<string, unknown>, toState: string | null) => string> = {
	pull: (d, to) =>
		to === 'scrapped'
			? `Logged and scrapped${after(': ', d.reason)}`
			: `Logged as ${word(d.grade)}${after(', put in ', d.to)}`,
	move: (d, to) => `Moved to ${word(d.to)}${to === 'back' ? ' (red bin)' : ''}`,
	grade: (d) => `Graded ${word(d.grade)}${after(', was ', d.was)}`,
	edit: (d) => `Changed: ${Array.isArray(d.changed) ? d.changed.join(', ') : 'details'}`,
	photo: () => 'Photo added',
	prove: (d) =>
		`${word(d.how)}: ${d.passed === true ? 'passed' : 'failed'}${after(', ', d.figure)}`,
	clean: (d) => `Cleaned: ${d.cameRight === true ? 'came right' : 'not right yet'}`,
	hold: (d) => `Held for ${word(d.for)}`,
	free: (d) => (d.expired === true ? 'The hold ran out' : 'Freed'),
	fit: (d) => `Fitted on ${word(d.job)}`,
	sell: (d) => `Sold${after(' to ', d.to)}`,
	'take back': (d) => `Came back${after(': ', d.reason)}`,
	scrap: (d) => `${d.destroyed === true ? 'Destroyed' : 'Scrapped'}${after(': ', d.reason)}`,
	miss: () => 'Not found where it should be',
	find: () => 'Turned up again',
	undo: (d) => `Undone: ${word(d.said)}`
};

/** An event of a part in words. */
export function happened({ what, toState, detail }: Happened): string {
	const words = SAID[what]?.(detail, toState) ?? what;
	return words.charAt(0).toUpperCase() + words.slice(1);
}

/** A proof and a photo stay; everything else may be taken back while nothing came after it. */
export const mayUndo = (what: string): boolean =>
	isMove(what) && what !== 'prove' && what !== 'photo';

export const UNDO_DAYS = 30;
