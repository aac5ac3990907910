import { engineKey } from '../codes/number';
import { plainFractions, tokensOf, type Token } from '../donors/lexemes';
import { readCause, readMonth } from './cause-words';
import { readKinds } from './kinds-said';
import { causeNeed, needOf, type Need } from './need';
import { NO_WORDS, type Lexicon } from './lexicon';
import { asDoubtful, asNumber, asTags, type Doubtful } from './number';
import { readFilters, type SaidFilters } from './said-filters';
import { WEAK_WORDS } from './weak-words';

/** What somebody typed, read into what it may mean. */
export interface Plan {
	/** All of it, tidied; '' when nothing was typed. */
	text: string;
	tag: string | null;
	/** Tags that it would be with one character put right. */
	nearTags: string[];
	/** All of it as a part number, in the spelling in which numbers are compared. */
	numberKey: string | null;
	doubtful: Doubtful | null;
	donorNumber: number | null;
	/** An address, or the beginning of addresses: K3 stands for K3-1 and K3-2. */
	bin: string | null;
	kinds: string[];
	/** Kinds that only come near: offered, not searched. */
	nearKinds: string[];
	/** Kinds that the same word may mean: somebody has to say which. */
	ask: string[];
	/** Kinds guessed from pieces of names: what has every word comes before them. */
	guessed: boolean;
	/** Each of these ways to say a thing counts; all things must be there. */
	needs: Need[];
	/** The same without the kinds: every word to the letter. */
	literally: Need[];
	/** Colours and the like: they move an answer up and shut none out. */
	weak: string[];
	filters: SaidFilters;
	/** What names the engine, as engines are compared. */
	engine: string[];
	/** Words that are left, as typed. */
	words: string[];
}

const DONOR = /^d0*([1-9]\d{0,6})$/;
const BIN = /^[a-z]{1,3}\d{1,2}(-\d{1,3})?$/;
const MOST_WORDS = 8;
/** Heard with a part, but it may stand in a note: it moves an answer up. */
const COLOURS =
	'red blue black white green yellow orange gray grey silver gold brown purple old big small'.split(
		' '
	);

const tidy = (typed: string): string =>
	plainFractions(typed.slice(0, 200))
		.normalize('NFKC')
		.replace(/[\p{C}\s]+/gu, ' ')
		.trim();

const piecesOf = (text: string) =>
	text
		.split(/[^\p{L}\p{N}./-]+/u)
		.map((token) => token.replace(/^[./-]+|[./-]+$/g, ''))
		.filter(Boolean);

const isWeak = ({ said, lexeme }: Token) => WEAK_WORDS.has(said) || WEAK_WORDS.has(lexeme);

/** What names an engine: codes where there are any, else the words. */
function engineOf(tokens: readonly Token[]): string[] {
	const codes = tokens.filter(
		({ is, lexeme }) => is === 'code' && (lexeme.length > 3 || /[A-Z]/.test(lexeme))
	);
	const words = tokens.filter(({ is, lexeme }) => is === 'word' && lexeme.length > 2);
	const naming = codes.length > 0 ? codes : words;
	return naming.map(({ said }) => engineKey(said)).filter(Boolean);
}

function place(pieces: readonly string[], kinds: readonly string[], isDated: boolean) {
	const donor = pieces.find((piece) => DONOR.test(piece));
	const bin = pieces.find((piece) => piece !== donor && BIN.test(piece));
	const sure = bin && (pieces.length === 1 || kinds.length > 0 || bin.includes('-') || isDated);
	return { donor, bin: sure ? bin : undefined };
}

/**
 * Reads what was typed. In: anything, any length; the words that the shop has written. Out: the tag,
 * part number, donor, bin, kinds, sizes, cause, month, filters and words that it may mean; what says
 * nothing is dropped. Never throws.
 */
export function readSearch(typed: string, words: Lexicon = NO_WORDS): Plan {
	const text = tidy(typed);
	const { rest: unfiltered, ...filters } = readFilters(text.toLowerCase());
	const { month, rest: undated } = readMonth(unfiltered);
	const { causes, said: caused, rest } = readCause(undated);
	const { kinds, nearKinds, ask, guessed, saysKind } = readKinds(rest, words);
	const { donor, bin } = place(piecesOf(rest), kinds, month !== null);
	const { tag, near: nearTags } = asTags(text);
	const doubtful = asDoubtful(text);
	const all = tokensOf(rest).filter(
		({ said }) => said !== donor && said !== bin && !said.includes('?')
	);
	const left = all.filter((token) => !isWeak(token) && !saysKind(token)).slice(0, MOST_WORDS);
	const last = all.at(-1);
	const asNeed = (token: Token) => needOf(token, token === last, words);
	const around = [
		...(month ? [{ said: month, exact: [`@${month}`], near: [`@${month}`] }] : []),
		...(causes.length > 0 ? [causeNeed(caused, causes)] : [])
	];
	return {
		text,
		tag,
		nearTags: kinds.length > 0 ? [] : nearTags,
		numberKey: kinds.length === 0 || asNumber(text) ? asNumber(text) : null,
		doubtful,
		donorNumber: donor ? Number(DONOR.exec(donor)?.[1]) : null,
		bin: bin?.toUpperCase() ?? null,
		kinds,
		nearKinds,
		ask,
		guessed,
		needs: [...left.map(asNeed), ...around],
		literally: [
			...all
				.filter((token) => !isWeak(token))
				.slice(0, MOST_WORDS)
				.map(asNeed),
			...around
		],
		weak: all.map(({ lexeme }) => lexeme).filter((lexeme) => COLOURS.includes(lexeme)),
		filters,
		engine: engineOf(left),
		words: left.map(({ said }) => said)
	};
}
