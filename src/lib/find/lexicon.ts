import { editsBetween, soundOf } from '../trade/spelling';

/** The words that a shop has written about its parts. */
export interface Lexicon {
	has(word: string): boolean;
	/** The known words that come nearest to one that is not known; empty when none comes near. */
	nearest(word: string): string[];
}

export const NO_WORDS: Lexicon = { has: () => false, nearest: () => [] };

const MOST = 4;
const slipsIn = (word: string) => (word.length >= 6 ? 2 : word.length >= 3 ? 1 : 0);

/** Words under their length, so that only those that can be near are compared. */
export class WordList implements Lexicon {
	readonly #words = new Set<string>();
	readonly #byLength = new Map<number, string[]>();

	add(words: readonly string[]): void {
		for (const word of words) {
			if (this.#words.has(word)) continue;
			this.#words.add(word);
			const same = this.#byLength.get(word.length);
			if (same) same.push(word);
			else this.#byLength.set(word.length, [word]);
		}
	}

	has(word: string): boolean {
		return this.#words.has(word);
	}

	nearest(word: string): string[] {
		let least = slipsIn(word);
		if (least === 0) return [];
		let nearest: string[] = [];
		for (let length = word.length - least; length <= word.length + least; length += 1) {
			for (const known of this.#byLength.get(length) ?? []) {
				const edits = editsBetween(word, known, least);
				if (edits > least) continue;
				nearest = edits < least ? [known] : [...nearest, known];
				least = edits;
			}
		}
		return alikeFirst(word, nearest).slice(0, MOST);
	}
}

function alikeFirst(word: string, near: string[]): string[] {
	const heard = soundOf(word);
	const unlike = (known: string) =>
		(soundOf(known) === heard ? 0 : 2) + (known[0] === word[0] ? 0 : 1);
	return near.sort((a, b) => unlike(a) - unlike(b));
}
