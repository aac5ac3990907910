import { kinds as everyKind, kindWords, matchKinds, type KindMatch } from '../trade';
import { wordsOf } from '../trade/spelling';
import type { Token } from '../donors/lexemes';
import { WordList, type Lexicon } from './lexicon';
import { WEAK_WORDS } from './weak-words';

export interface KindsSaid {
	kinds: string[];
	nearKinds: string[];
	ask: string[];
	/** The kinds were guessed from pieces of names, and the shop has written all of the words itself. */
	guessed: boolean;
	/** Whether a word only says the kind again, however it is spelt. */
	saysKind(token: Token): boolean;
}

const isSure = ({ how }: KindMatch) => how !== 'near';
const ids = (some: readonly KindMatch[]) => some.map(({ kind }) => kind.id);

/** Two kinds that one word may mean by its sound; what is said beside it points to one of them. */
const CONFUSED: { kinds: [string, string]; exact: [RegExp, RegExp]; points: [RegExp, RegExp] }[] = [
	{
		kinds: ['starter12', 'stator'],
		exact: [/\bstart/, /\bstators?\b/],
		points: [/tooth|teeth|pinion|12 ?v|crank|bendix/, /wire|charg|amp|magnet|\bac\b|\bdc\b|coil/]
	}
];

/** The kinds whose name begins like what is being typed. */
function beginning(text: string): string[] {
	const last = wordsOf(text).at(-1);
	if (!last || /\d/.test(last)) return [];
	return everyKind
		.filter(
			({ id, name }) =>
				wordsOf(name)[0]?.startsWith(last) ||
				kindWords(id).some((word) => last.length > 1 && word.startsWith(last))
		)
		.sort((a, b) => b.callsPerYear - a.callsPerYear)
		.slice(0, 8)
		.map(({ id }) => id);
}

const holding = new Map<string, string[]>();
for (const { id } of everyKind)
	for (const word of kindWords(id)) holding.set(word, [...(holding.get(word) ?? []), id]);
/** Names with a hyphen are also typed in one word. */
for (const { id, name, alsoCalled } of everyKind)
	for (const said of [name, ...alsoCalled].flatMap(
		(one) => one.toLowerCase().match(/\p{L}+-\p{L}+/gu) ?? []
	))
		holding.set(said.replace('-', ''), [...(holding.get(said.replace('-', '')) ?? []), id]);
const TRADE_WORDS = new WordList();
TRADE_WORDS.add([...holding.keys()].filter((word) => /^\p{L}{3,}$/u.test(word)));

/** The kinds in whose names most of the words stand, spelling forgiven; a word apart from its whole name. */
function partly(strong: readonly string[], words: Lexicon): string[] {
	const explained = new Map<string, number>();
	for (const word of strong) {
		const known = holding.has(word) || words.has(word) ? [word] : TRADE_WORDS.nearest(word);
		for (const id of new Set(known.flatMap((one) => holding.get(one) ?? [])))
			explained.set(id, (explained.get(id) ?? 0) + 1);
	}
	const most = Math.max(0, ...explained.values());
	const best = [...explained].filter(([, count]) => count === most).map(([id]) => id);
	return best.length <= 8 ? best : [];
}

function matched(
	text: string,
	words: Lexicon
): { kinds: string[]; nearKinds: string[]; guessed?: boolean } {
	const matches = matchKinds(text);
	const sure = matches.filter(isSure);
	if (sure.length > 0)
		return { kinds: ids(sure), nearKinds: ids(matches.filter((one) => !isSure(one))) };
	const strong = wordsOf(text).filter((word) => !WEAK_WORDS.has(word) && !words.has(word));
	const near = matchKinds(strong.join(' '));
	if (near.length > 0) return { kinds: ids(near.slice(0, 1)), nearKinds: ids(near.slice(1)) };
	const some = partly(strong, words);
	if (some.length > 0)
		return { kinds: some, nearKinds: [], guessed: wordsOf(text).every((one) => words.has(one)) };
	const begun = strong.length === 1 && wordsOf(text).length === 1 ? beginning(text) : [];
	return { kinds: begun, nearKinds: [] };
}

function confused(text: string, kinds: string[]): { kinds: string[]; ask: string[] } {
	for (const { kinds: pair, exact, points } of CONFUSED) {
		if (!pair.every((id) => kinds.includes(id))) continue;
		const said = exact.map((one) => one.test(text));
		if (said[0] !== said[1])
			return { kinds: kinds.filter((id) => id !== pair[said[0] ? 1 : 0]), ask: [] };
		const [first, second] = points[1].test(text) ? [pair[1], pair[0]] : pair;
		const rest = kinds.filter((id) => !pair.includes(id));
		return { kinds: [first, second, ...rest], ask: said[0] ? [] : [...pair] };
	}
	return { kinds, ask: [] };
}

/** The kinds that a text names; two that sound alike are told apart by what is said, or asked about. */
export function readKinds(text: string, words: Lexicon): KindsSaid {
	const { kinds: found, nearKinds, guessed = false } = matched(text, words);
	const { kinds, ask } = confused(text, found);
	const saying = new Set(kinds.flatMap(kindWords));
	const near = new WordList();
	near.add([...saying]);
	const isBegun = wordsOf(text).length === 1 && found.length > 0;
	return {
		kinds,
		nearKinds,
		ask,
		guessed,
		saysKind: ({ said, lexeme, is }) => {
			if (is === 'size' || is === 'amount') return false;
			if (saying.has(lexeme) || saying.has(said.replace(/s$/, ''))) return true;
			if (isBegun || matchKinds(said).some(({ kind }) => found.includes(kind.id))) return true;
			return is === 'word' && !words.has(lexeme) && near.nearest(lexeme).length > 0;
		}
	};
}
