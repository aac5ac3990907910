/** A stream of draws; the same seed and names give the same stream, whatever else was drawn. */
export interface Draws {
	/** From 0 to below 1. */
	next(): number;
	exponential(rate: number): number;
	/** Standard normal. */
	normal(): number;
	pick<Value>(values: readonly Value[]): Value;
	weighted<Value>(pairs: readonly (readonly [Value, number])[]): Value;
}

function hash(text: string): number {
	let state = 2166136261;
	for (let at = 0; at < text.length; at++)
		state = Math.imul(state ^ text.charCodeAt(at), 16777619) >>> 0;
	state = Math.imul(state ^ (state >>> 16), 2246822507);
	return (state ^ (state >>> 13)) >>> 0;
}

function uniform(seed: number): () => number {
	let state = seed;
	return () => {
		state = (state + 0x6d2b79f5) >>> 0;
		let mixed = Math.imul(state ^ (state >>> 15), state | 1);
		mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
		return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
	};
}

export function draws(seed: number, ...names: readonly (string | number)[]): Draws {
	const next = uniform(hash([seed, ...names].join('/')));
	const at = <Value>(values: readonly Value[], place: number): Value => {
		const value = values[Math.min(place, values.length - 1)];
		if (value === undefined) throw new RangeError('nothing to draw from');
		return value;
	};
	return {
		next,
		exponential: (rate) => (rate > 0 ? -Math.log1p(-next()) / rate : Infinity),
		normal: () => Math.sqrt(-2 * Math.log1p(-next())) * Math.cos(2 * Math.PI * next()),
		pick: (values) => at(values, Math.floor(next() * values.length)),
		weighted: (pairs) => {
			let left = next() * pairs.reduce((sum, [, weight]) => sum + weight, 0);
			const place = pairs.findIndex(([, weight]) => (left -= weight) < 0);
			return at(pairs, place < 0 ? pairs.length - 1 : place)[0];
		}
	};
}
