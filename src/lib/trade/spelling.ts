/**
 * How many single edits part two words, a swap of neighbours counting as one: optimal string
 * alignment. Gives `most + 1` as soon as it is sure to be more than `most`.
 */
export function editsBetween(a: string, b: string, most: number): number {
	if (Math.abs(a.length - b.length) > most) return most + 1;
	let before: number[] = [];
	let last = Array.from({ length: b.length + 1 }, (_unused, at) => at);
	for (let i = 1; i <= a.length; i += 1) {
		const row = [i];
		for (let j = 1; j <= b.length; j += 1) {
			const differs = a[i - 1] === b[j - 1] ? 0 : 1;
			let least = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + differs);
			if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
				least = Math.min(least, (before[j - 2] ?? 0) + 1);
			}
			row.push(least);
		}
		if (Math.min(...row) > most) return most + 1;
		before = last;
		last = row;
	}
	return last[b.length] ?? most + 1;
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
