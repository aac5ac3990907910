import { checkCharacter } from './check-character';

/** The characters of a tag: 0-9 and A-Z without I, L, O and U, which are misread by hand. */
export const TAG_SYMBOLS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
export const TAG_LENGTH = 5;

export type TagReading = { tag: string } | { problem: 'length' | 'check'; suggestion?: string };

/** Whether this is a tag exactly as printed: five characters, the last of them checking the rest. */
export function isTag(text: string): boolean {
	if (text.length !== TAG_LENGTH) return false;
	if ([...text].some((character) => !TAG_SYMBOLS.includes(character))) return false;
	return checkCharacter(text.slice(0, -1)) === text.slice(-1);
}

/**
 * A new tag. In: a source of random whole numbers, 0 or more, spread evenly over a multiple of 32
 * (a random 32-bit word does). Out: five characters. A body whose check character would be one
 * that is left out is thrown away and drawn again. Throws RangeError on a source that gives no
 * whole numbers, or the same over and over.
 */
export function makeTag(random: () => number): string {
	for (let attempt = 0; attempt < 200; attempt += 1) {
		const tag = withCheck(draw(random));
		if (isTag(tag)) return tag;
	}
	throw new RangeError('the random source does not vary');
}

function draw(random: () => number): string {
	let body = '';
	while (body.length < TAG_LENGTH - 1) {
		const drawn = random();
		if (!Number.isSafeInteger(drawn) || drawn < 0) {
			throw new RangeError('the random source must give whole numbers, 0 or more');
		}
		body += TAG_SYMBOLS.charAt(drawn % TAG_SYMBOLS.length);
	}
	return body;
}

function withCheck(body: string): string {
	return body + checkCharacter(body);
}

/**
 * What somebody typed or scanned, as a tag. Case, spaces and dashes do not matter; O is read as 0,
 * I and L as 1. Out: the tag, or what is wrong: another length than five, or a check that does not
 * fit; then with the one tag that comes out when two neighbours are swapped back, if there is one.
 */
export function readTag(typed: string): TagReading {
	const folded = typed
		.toUpperCase()
		.replace(/[\s\p{Pd}_.]/gu, '')
		.replaceAll('O', '0')
		.replace(/[IL]/g, '1');
	if (folded.length !== TAG_LENGTH) return { problem: 'length' };
	if (isTag(folded)) return { tag: folded };
	const suggestion = swappedBack(folded);
	return suggestion ? { problem: 'check', suggestion } : { problem: 'check' };
}

function swappedBack(text: string): string | undefined {
	const found = new Set<string>();
	for (let at = 0; at < text.length - 1; at += 1) {
		const swapped = text.slice(0, at) + text.charAt(at + 1) + text.charAt(at) + text.slice(at + 2);
		if (isTag(swapped)) found.add(swapped);
	}
	return found.size === 1 ? [...found][0] : undefined;
}
