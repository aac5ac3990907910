/** A search as its address carries it: what is '' or missing was not asked. */
export interface Question {
	q?: string | undefined;
	kind?: string | undefined;
	grade?: string | undefined;
	bin?: string | undefined;
	state?: string | undefined;
	donor?: string | undefined;
	engine?: string | undefined;
	price?: string | undefined;
	proof?: string | undefined;
	/** A group of the same things, taken apart. */
	same?: string | undefined;
	sort?: string | undefined;
	down?: string | undefined;
	/** Columns of the table, apart by dots. */
	columns?: string | undefined;
	view?: string | undefined;
	limit?: number | undefined;
	cursor?: string | undefined;
}

/** What narrows an answer; a link that starts afresh takes all of it off. */
export const NARROWING = [
	...(['kind', 'grade', 'state', 'bin', 'engine', 'price', 'proof', 'donor', 'same'] as const)
];
const ORDER = [
	...(['q', ...NARROWING, 'sort', 'down', 'columns', 'view', 'limit', 'cursor'] as const)
];
const USUAL_LIMIT = 25;
const MOST = 100;

/**
 * The search part of an address. In: a question and what is to be changed in it. Out: without the
 * question mark, '' when nothing is asked; a change of anything but the page starts at the first page.
 */
export function searchOf(question: Question, change: Question = {}): string {
	const turns = 'cursor' in change || 'limit' in change;
	const next = { ...question, ...(turns ? {} : { cursor: '', limit: USUAL_LIMIT }), ...change };
	const asked = new URLSearchParams();
	for (const name of ORDER) {
		const value = String(next[name] ?? '').trim();
		if (value !== '' && !(name === 'limit' && value === String(USUAL_LIMIT)))
			asked.set(name, value);
	}
	return asked.toString();
}

/** The address without anything that narrows, and with what is to be changed. */
export const searchAfresh = (question: Question, change: Question = {}): string =>
	searchOf(question, { ...Object.fromEntries(NARROWING.map((name) => [name, ''])), ...change });

/** The address that shows more: a longer list first, the following page once it is as long as may be. */
export function moreOf(question: Question, next: string | null): string | null {
	if (next === null) return null;
	const limit = question.limit ?? USUAL_LIMIT;
	if (limit < MOST && !question.cursor) {
		return searchOf(question, { limit: Math.min(limit * 2, MOST) });
	}
	return searchOf(question, { limit, cursor: next });
}
