interface Numbered {
	id: number;
	photoId: number;
	n: number;
	partId: number | null;
}

/** The lowest number that no pin of the photo has. */
export function freeNumber(taken: readonly number[]): number {
	let n = 1;
	while (taken.includes(n)) n += 1;
	return n;
}

/**
 * Which pins of a kind become those of a part that was just pulled: on each photo the lowest number that still waits
 * for its part. A second one of the same kind goes on waiting.
 */
export function followers(pins: readonly Numbered[]): number[] {
	const first = new Map<number, Numbered>();
	for (const pin of pins) {
		const found = first.get(pin.photoId);
		if (pin.partId === null && (!found || pin.n < found.n)) first.set(pin.photoId, pin);
	}
	return [...first.values()].map(({ id }) => id);
}
