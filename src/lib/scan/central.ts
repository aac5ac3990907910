/** A code in the picture and where its middle is, as shares of the picture's width and height. */
export interface Sight {
	text: string;
	x: number;
	y: number;
}

/** Of several tags in sight, the one that is aimed at: nearest to the middle. */
export function aimedAt(sights: readonly Sight[]): Sight | null {
	const off = ({ x, y }: Sight) => (x - 0.5) ** 2 + (y - 0.5) ** 2;
	return sights.reduce<Sight | null>(
		(best, one) => (best === null || off(one) < off(best) ? one : best),
		null
	);
}
