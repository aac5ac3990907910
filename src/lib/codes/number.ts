/**
 * A part number as it is compared: upper case, nothing but letters and digits, O read as 0 and I as 1.
 * @param typed a number as somebody wrote it, with or without dashes, dots or spaces
 * @returns the key, '' when nothing of it is a letter or digit
 */
export function numberKey(typed: string): string {
	return typed
		.toUpperCase()
		.replace(/[^0-9A-Z]/g, '')
		.replaceAll('O', '0')
		.replaceAll('I', '1');
}

/**
 * An engine's maker and model as they are compared: lower case, nothing but letters and digits.
 * @param said maker and model in one string
 * @returns the key, '' when nothing is left
 */
export function engineKey(said: string): string {
	return said.toLowerCase().replace(/[^0-9a-z]/g, '');
}
