/** The longest beginning that is no wider. At least one character, so that it ends. */
function cut(text: string, fits: (text: string) => boolean): string {
	const letters = [...text];
	let count = letters.length;
	while (count > 1 && !fits(letters.slice(0, count).join(''))) count -= 1;
	return letters.slice(0, count).join('');
}

/** Breaks a text into lines no wider than this; a word that is wider is broken too. */
export function broken(text: string, fits: (text: string) => boolean): string[] {
	const lines: string[] = [];
	let line = '';
	for (let word of text.trim().split(/\s+/)) {
		if (line && fits(`${line} ${word}`)) {
			line = `${line} ${word}`;
			continue;
		}
		if (line) lines.push(line);
		while (!fits(word) && [...word].length > 1) {
			const head = cut(word, fits);
			lines.push(head);
			word = word.slice(head.length);
		}
		line = word;
	}
	return line ? [...lines, line] : lines;
}

/** No more lines than this; where some are left out, the last ends in three dots. */
export function shortened(
	lines: string[],
	most: number,
	fits: (text: string) => boolean
): string[] {
	if (lines.length <= most) return lines;
	const last = cut(lines.slice(most - 1).join(' '), (text) => fits(`${text}…`));
	return [...lines.slice(0, most - 1), `${last}…`];
}
