/** A figure over seeds with the half width of its 95 % interval. */
export interface Estimate {
	mean: number;
	half: number;
}

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

/** Student's t that leaves 2.5 % above it. Source: Abramowitz and Stegun 1964, 26.7.5. */
export function studentT(freedom: number): number {
	const z = 1.959963985;
	const terms = [
		z,
		(z ** 3 + z) / 4,
		(5 * z ** 5 + 16 * z ** 3 + 3 * z) / 96,
		(3 * z ** 7 + 19 * z ** 5 + 17 * z ** 3 - 15 * z) / 384
	];
	return terms.reduce((total, term, power) => total + term / freedom ** power, 0);
}

/** Mean of the seeds' figures. One seed has no interval. */
export function estimate(values: readonly number[]): Estimate {
	const count = values.length;
	const mean = sum(values) / count;
	if (count < 2) return { mean, half: NaN };
	const variance = sum(values.map((value) => (value - mean) ** 2)) / (count - 1);
	return { mean, half: studentT(count - 1) * Math.sqrt(variance / count) };
}

/** Ratio of two sums over the same seeds; its interval by leaving one seed out at a time. */
export function ratio(above: readonly number[], below: readonly number[]): Estimate {
	const count = above.length;
	const mean = sum(above) / sum(below);
	if (count < 2) return { mean, half: NaN };
	const without = above.map((value, at) => (sum(above) - value) / (sum(below) - (below[at] ?? 0)));
	const middle = sum(without) / count;
	const variance = ((count - 1) / count) * sum(without.map((value) => (value - middle) ** 2));
	return { mean, half: studentT(count - 1) * Math.sqrt(variance) };
}
