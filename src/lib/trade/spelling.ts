// three rows of the table, kept from word to word: comparing must not make garbage
let rows = [new Uint16Array(64), new Uint16Array(64), new Uint16Array(64)] as const;

/**
 * How many single edits part two words, a swap of neighbours counting as one: optimal string
 * alignment. Gives `most + 1` as soon as it is sure to be more than `most`.
 */
export function editsBetween(a: string, b: string, most: number): number {
	if (Math.abs(a.length - b.length) > most) return most + 1;
	const size = b.length + 2;
	if (rows[0].length < size)
		rows = [new Uint16Array(size), new Uint16Array(size), new Uint16Array(size)];
	let [before, last, row] = rows;
	for (let j = 0; j <= b.length; j += 1) last[j] = j;
	for (let i = 1; i <= a.length; i += 1) {
		// what lies further from the diagonal than `most` cannot matter
		const from = Math.max(1, i - most);
		const to = Math.min(b.length, i + most);
		row[from - 1] = from === 1 ? i : most + 1;
		if (to < b.length) row[to + 1] = most + 1;
		let nearest = row[from - 1]!;
		for (let j = from; j <= to; j += 1) {
			const same = a.charCodeAt(i - 1) === b.charCodeAt(j - 1);
			let least = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + (same ? 0 : 1));
			const swaps =
				i > 1 &&
				j > 1 &&
				a.charCodeAt(i - 1) === b.charCodeAt(j - 2) &&
				a.charCodeAt(i - 2) === b.charCodeAt(j - 1);
			if (swaps) least = Math.min(least, before[j - 2]! + 1);
			row[j] = least;
			if (least < nearest) nearest = least;
		}
		if (nearest > most) return most + 1;
		[before, last, row] = [last, row, before];
	}
	return Math.min(last[b.length]!, most + 1);
}

/** Which letters a word has, a bit for each; letters that share one are taken for the same. */
export function lettersOf(word: string): number {
	let letters = 0;
	for (let at = 0; at < word.length; at += 1) letters |= 1 << (word.charCodeAt(at) & 31);
	return letters;
}

/**
 * Whether two words may be at most that many edits apart, by the letters they have: an edit brings
 * in one and takes out one at most. Cheap, and never wrong when it says no.
 */
export function mayBeNear(letters: number, others: number, most: number): boolean {
	let apart = letters ^ others;
	for (let left = 2 * most; apart !== 0; left -= 1) {
		if (left === 0) return false;
		apart &= apart - 1;
	}
	return true;
}

/** Words that sound alike give the same key: the hard consonants in order, and a first vowel. */
export function soundOf(word: string): string {
	const hard = word
		.replace(/ph/g, 'f')
		.replace(/c(?=[eiy])/g, 's')
		.replace(/[cq]k?/g, 'k')
		.replace(/x/g, 'ks')
		.replace(/z/g, 's')
		.replace(/gh|wh|(?<=.)h/g, '')
		.replace(/(.)\1+/g, '$1');
	const first = /^[aeiouy]/.test(hard) ? 'a' : '';
	return first + hard.replace(/[aeiouyw]/g, '');
}

/** A text as plain lower-case words, plural s taken off. */
export function wordsOf(text: string): string[] {
	return text
		.toLowerCase()
		.normalize('NFKD')
		.replace(/\p{M}/gu, '')
		.split(/[^\p{L}\p{N}]+/u)
		.filter(Boolean)
		.map((word) => (/[^s]s$/.test(word) && word.length > 3 ? word.slice(0, -1) : word));
}
