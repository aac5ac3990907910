import { Refused } from '$lib/refusal';

/** Where the page before ended: the value it was sorted by and the row's own number. */
export interface PlaceAfter {
	value: string;
	id: number;
}

export const nextAfter = (value: string | number, id: number): string =>
	Buffer.from(JSON.stringify([String(value), id])).toString('base64url');

/** Reads a cursor; one that was not given out by the list is refused. */
export function placeAfter(cursor: string | undefined, as: 'text' | 'bigint'): PlaceAfter | null {
	if (!cursor) return null;
	try {
		const [value, id] = JSON.parse(Buffer.from(cursor, 'base64url').toString()) as unknown[];
		const fits = typeof value === 'string' && (as === 'text' || /^-?\d{1,15}$/.test(value));
		if (fits && Number.isSafeInteger(id)) return { value, id: id as number };
	} catch {
		// falls through to the refusal
	}
	throw new Refused('bad input', 'Take the cursor from the page before as it is', 'cursor');
}
