import { readTag } from '../codes';
import { numberKey } from '../codes/number';
import { kindWords, matchKinds, type KindMatch } from '../trade';
import { WEAK_WORDS } from './weak-words';

/** What somebody typed, read into what it may mean. */
export interface Plan {
	/** All of it, tidied; '' when nothing was typed. */
	text: string;
	tag: string | null;
	/** All of it as a part number, in the spelling in which numbers are compared. */
	numberKey: string | null;
	donorNumber: number | null;
	/** An address, or the beginning of addresses: K3 stands for K3-1 and K3-2. */
	bin: string | null;
	kinds: string[];
	/** Kinds that only come near: offered, not searched. */
	nearKinds: string[];
	words: string[];
}

const DONOR = /^d0*([1-9]\d{0,6})$/;
const BIN = /^[a-z]{1,3}\d{1,2}(-\d{1,3})?$/;
const MOST_WORDS = 6;

const tidy = (typed: string): string =>
	typed
		.slice(0, 200)
		.normalize('NFKC')
		.replace(/[\p{C}\s]+/gu, ' ')
		.trim();

const tokensOf = (text: string): string[] =>
	text
		.toLowerCase()
		.split(/[^\p{L}\p{N}./-]+/u)
		.map((token) => token.replace(/^[./-]+|[./-]+$/g, ''))
		.filter(Boolean);

const isSure = ({ how }: KindMatch) => how !== 'near';

/** A number if 4 to 24 long, with a digit, of pieces that are digits or short and name no kind. */
function asNumber(text: string): string | null {
	const key = numberKey(text);
	if (key.length < 4 || key.length > 24 || !/\d/.test(text)) return null;
	const pieces = text.split(/[^\p{L}\p{N}]+/u).filter(Boolean);
	const fits = pieces.every((piece) => /\d/.test(piece) || piece.length <= 4);
	return fits && !pieces.some((piece) => matchKinds(piece).some(isSure)) ? key : null;
}

function asKinds(text: string): { kinds: string[]; nearKinds: string[] } {
	const matches = matchKinds(text);
	const sure = matches.filter(isSure);
	const strong = tokensOf(text).filter((token) => !WEAK_WORDS.has(token));
	const near = sure.length > 0 ? [] : matchKinds(strong.join(' '));
	const ids = (some: KindMatch[]) => some.map((match) => match.kind.id);
	return sure.length > 0
		? { kinds: ids(sure), nearKinds: ids(matches.filter((match) => !isSure(match))) }
		: { kinds: ids(near.slice(0, 1)), nearKinds: ids(near.slice(1)) };
}

/** Whether a word only says the kind again, however it is spelt. */
function saysKind(word: string, kinds: readonly string[]): boolean {
	if (kinds.some((id) => kindWords(id).includes(word.replace(/s$/, '')))) return true;
	return matchKinds(word).some((match) => kinds.includes(match.kind.id));
}

function theRest(tokens: readonly string[], kinds: readonly string[]): string[] {
	const rest = tokens.filter(
		(token) => token.length > 1 && !WEAK_WORDS.has(token) && !saysKind(token, kinds)
	);
	return [...new Set(rest)].slice(0, MOST_WORDS);
}

/**
 * Reads what was typed. In: anything, any length. Out: the tag, part number, donor, bin, kinds and
 * words that it may mean; words that say nothing are dropped. Never throws.
 */
export function readSearch(typed: string): Plan {
	const text = tidy(typed);
	const tokens = tokensOf(text);
	const tag = readTag(text);
	const donor = tokens.find((token) => DONOR.test(token));
	const bin = tokens.find((token) => token !== donor && BIN.test(token)) ?? null;
	const { kinds, nearKinds } = asKinds(text);
	const isPlace = bin !== null && (tokens.length === 1 || kinds.length > 0 || bin.includes('-'));
	const left = tokens.filter((token) => token !== donor && !(isPlace && token === bin));
	return {
		text,
		tag: 'tag' in tag ? tag.tag : null,
		numberKey: asNumber(text),
		donorNumber: donor ? Number(DONOR.exec(donor)?.[1]) : null,
		bin: isPlace ? bin.toUpperCase() : null,
		kinds,
		nearKinds,
		words: theRest(left, kinds)
	};
}
