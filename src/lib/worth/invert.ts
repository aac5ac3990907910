const TURNS = 1200;

/**
 * Where a rising function reaches a level, by halving the interval until no number is left between.
 * In: the function, the level, an interval that holds the place. Out: the place.
 */
export function placeOf(
	rising: (x: number) => number,
	level: number,
	low: number,
	high: number
): number {
	for (let turn = 0; turn < TURNS; turn += 1) {
		const middle = low + (high - low) / 2;
		if (middle <= low || middle >= high) break;
		if (rising(middle) < level) low = middle;
		else high = middle;
	}
	return low + (high - low) / 2;
}

/** The same on 0 to infinity: doubles until the level lies inside. */
export function placeAbove(rising: (x: number) => number, level: number, guess: number): number {
	let high = guess > 0 ? guess : 1;
	while (rising(high) < level && high < 1e300) high *= 2;
	return placeOf(rising, level, 0, high);
}
