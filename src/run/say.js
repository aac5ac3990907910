/** @typedef {(line: string) => void} Log */

/**
 * Runs one step and says what it does and how long it took.
 * @template T
 * @param {string} what
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(what, work) {
	const began = performance.now();
	console.log(`  ${what} ...`);
	try {
		const result = await work();
		const seconds = (performance.now() - began) / 1000;
		if (seconds >= 0.1) console.log(`  ${what}: ${seconds.toFixed(1)} s`);
		return result;
	} catch (error) {
		console.log(`  ${what}: failed`);
		throw error;
	}
}

/** An error whose message is all that the reader needs: no stack is shown. */
export class Stop extends Error {}

/**
 * @param {unknown} error
 * @returns {string}
 */
export function inWords(error) {
	if (error instanceof Stop) return error.message;
	if (error instanceof Error) return error.stack ?? error.message;
	return String(error);
}
