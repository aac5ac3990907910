import { tokensOf, type Token } from '../donors/lexemes';
import type { Lexicon } from './lexicon';

/** One thing that was said: the lexemes that mean it, and those that come near; a * stands for any ending. */
export interface Need {
	said: string;
	exact: string[];
	near: string[];
}

/** Power by displacement, as small engines are built: 28 to 36 cc for each horsepower. */
function classOf(hp: number): string[] {
	const from = Math.ceil(hp * 28);
	const count = Math.min(Math.floor(hp * 36) - from + 1, 120);
	return hp > 0 && count > 0 ? Array.from({ length: count }, (_, at) => `${from + at}cc`) : [];
}

/** The lexemes that mean a token; the last one that was typed may go on. */
export function needOf({ said, is, lexeme, pieces }: Token, last: boolean, words: Lexicon): Need {
	if (is === 'size') return { said, exact: [lexeme], near: [lexeme] };
	if (is === 'amount') {
		const hp = /^([\d.]+)hp$/.exec(lexeme)?.[1];
		const exact = [lexeme, ...pieces];
		return { said, exact, near: hp ? [...exact, ...classOf(Number(hp))] : exact };
	}
	if (is === 'code') {
		const exact = /^[1-9]\d{1,3}$/.test(lexeme) ? [lexeme, `${Number(lexeme)}cc`] : [lexeme];
		return { said, exact, near: lexeme.length > 2 || last ? [...exact, `${lexeme}*`] : exact };
	}
	const near = words.has(lexeme) ? [] : words.nearest(lexeme);
	const open = lexeme.length > 2 || last ? [`${lexeme}*`] : [];
	return { said, exact: [lexeme], near: [lexeme, ...near, ...open] };
}

/** A cause in any word for it, or the word itself in a note. */
export function causeNeed(said: string, causes: readonly string[]): Need {
	const known = causes.map((cause) => `~${cause}`);
	const [word] = tokensOf(said);
	const exact = word ? [...known, word.lexeme] : known;
	return { said, exact, near: exact };
}
