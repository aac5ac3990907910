import type { Figure } from './learned-view';

/** A figure of which nothing was seen: the usual one to the letter. */
export const unmoved = (usual: number): Figure => ({
	...{ usual, mean: usual, low: usual, high: usual },
	observations: 0
});

/** Keeps what was worked out: intervals take time and parts of a kind ask for the same one. */
export function once<Value>(): (key: string, work: () => Value) => Value {
	const known = new Map<string, Value>();
	return (key, work) => {
		const found = known.get(key);
		if (found !== undefined) return found;
		const value = work();
		known.set(key, value);
		return value;
	};
}
