const SYMBOLS = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/**
 * The check character of ISO 7064 MOD 37,36. In: a body of 0-9 and A-Z, any length. Out: one
 * character of the same 36. Throws RangeError on any other character.
 */
export function checkCharacter(body: string): string {
	let rest = 36;
	for (const character of body) {
		const value = SYMBOLS.indexOf(character);
		if (value < 0) throw new RangeError(`not a character of 0-9A-Z: ${character}`);
		rest = (rest + value) % 36 || 36;
		rest = (rest * 2) % 37;
	}
	return SYMBOLS.charAt((37 - rest) % 36);
}
