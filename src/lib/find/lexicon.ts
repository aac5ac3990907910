import { editsBetween, lettersOf, mayBeNear, soundOf } from '../trade/spelling';

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
	readonly #bySound = new Map<string, string[]>();
	readonly #byLength = new Map<number, { word: string; letters: number }[]>();

	add(words: readonly string[]): void {
		for (const word of words) {
			if (this.#words.has(word)) continue;
			this.#words.add(word);
			const heard = soundOf(word);
			const alike = this.#bySound.get(heard);
			if (alike) alike.push(word);
			else this.#bySound.set(heard, [word]);
			const same = this.#byLength.get(word.length);
			const one = { word, letters: lettersOf(word) };
			if (same) same.push(one);
			else this.#byLength.set(word.length, [one]);
		}
	}

	has(word: string): boolean {
		return this.#words.has(word);
	}

	/** Written as it is heard, with more slips than letters tell: grovic for Grauvik. */
	#soundingLike(word: string): string[] {
		const heard = soundOf(word);
		if (heard.length < 4) return [];
		return (this.#bySound.get(heard) ?? []).filter((known) => known[0] === word[0]);
	}

	nearest(word: string): string[] {
		let least = slipsIn(word);
		if (least === 0) return [];
		let nearest: string[] = [];
		const letters = lettersOf(word);
		for (let length = word.length - least; length <= word.length + least; length += 1) {
			for (const { word: known, letters: theirs } of this.#byLength.get(length) ?? []) {
				if (!mayBeNear(letters, theirs, least)) continue;
				const edits = editsBetween(word, known, least);
				if (edits > least) continue;
				nearest = edits < least ? [known] : [...nearest, known];
				least = edits;
			}
		}
		if (nearest.length === 0) nearest = this.#soundingLike(word);
		return alikeFirst(word, nearest).slice(0, MOST);
	}
}

function alikeFirst(word: string, near: string[]): string[] {
	const heard = soundOf(word);
	const unlike = (known: string) =>
		(soundOf(known) === heard ? 0 : 2) + (known[0] === word[0] ? 0 : 1);
	return near.sort((a, b) => unlike(a) - unlike(b));
}
