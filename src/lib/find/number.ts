import { isTag, readTag, TAG_LENGTH, TAG_SYMBOLS } from '../codes';
import { numberKey } from '../codes/number';
import { tokensOf } from '../donors/lexemes';
import { matchKinds } from '../trade';

/** All of it as a part number: 4 to 24 long, with a digit, of pieces that are digits or short and name no kind. */
export function asNumber(text: string): string | null {
	const key = numberKey(text);
	if (key.length < 4 || key.length > 24 || !/\d/.test(text)) return null;
	// 6469V is no voltage, 12 V is
	const measures = tokensOf(text).some(
		({ is, lexeme }) => is === 'size' || (is === 'amount' && !/^\d{4,}(v|amp)$/.test(lexeme))
	);
	if (measures) return null;
	const pieces = text.split(/[^\p{L}\p{N}]+/u).filter(Boolean);
	const fits = pieces.every((piece) => /\d/.test(piece) || piece.length <= 4);
	const isKind = pieces.some((piece) => matchKinds(piece).some(({ how }) => how !== 'near'));
	return fits && !isKind ? key : null;
}

export interface Doubtful {
	/** The number with _ for each doubtful character, open at both ends. */
	like: string;
	/** Its longest piece that is sure, where that is four long or more. */
	run: string | null;
}

/** A number with ? for characters that could not be read; at least three must be sure. */
export function asDoubtful(text: string): Doubtful | null {
	const token = text.split(' ').find((one) => one.includes('?') && /\d/.test(one));
	if (!token) return null;
	const keys = token.split('?').map(numberKey);
	if (keys.join('').length < 3) return null;
	const run = keys.reduce((best, key) => (key.length > best.length ? key : best), '');
	return { like: `%${keys.join('_')}%`, run: run.length >= 4 ? run : null };
}

/** The tag that this is, and those that it would be with one character put right. */
export function asTags(text: string): { tag: string | null; near: string[] } {
	const read = readTag(text);
	if ('tag' in read) return { tag: read.tag, near: [] };
	const typed = text
		.toUpperCase()
		.replace(/[\s\-_.]/g, '')
		.replaceAll('O', '0')
		.replace(/[IL]/g, '1');
	if (Math.abs(typed.length - TAG_LENGTH) > 1 || /[^0-9A-Z]/.test(typed))
		return { tag: null, near: [] };
	const near = new Set('suggestion' in read && read.suggestion ? [read.suggestion] : []);
	for (let at = 0; at <= typed.length; at += 1) {
		const [before, after] = [typed.slice(0, at), typed.slice(at)];
		if (typed.length > TAG_LENGTH) near.add(before + after.slice(1));
		else
			for (const symbol of TAG_SYMBOLS)
				near.add(before + symbol + (typed.length === TAG_LENGTH ? after.slice(1) : after));
	}
	return { tag: null, near: [...near].filter(isTag) };
}
