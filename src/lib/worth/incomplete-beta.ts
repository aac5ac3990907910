import { placeOf } from './invert';
import { logGamma } from './log-gamma';

const TINY = 1e-300;
const MOST_TERMS = 20_000;

const kept = (x: number) => (Math.abs(x) < TINY ? TINY : x);

// the continued fraction of the incomplete beta function, evaluated by Lentz's method
function fraction(x: number, a: number, b: number): number {
	let c = 1;
	let d = 1 / kept(1 - ((a + b) * x) / (a + 1));
	let value = d;
	for (let m = 1; m <= MOST_TERMS; m += 1) {
		const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
		d = 1 / kept(1 + even * d);
		c = kept(1 + even / c);
		value *= d * c;
		const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
		d = 1 / kept(1 + odd * d);
		c = kept(1 + odd / c);
		value *= d * c;
		if (Math.abs(d * c - 1) < 1e-16) break;
	}
	return value;
}

/**
 * The share of a Beta(a, b) that lies at or below x: the regularised incomplete beta function.
 * In: x 0 to 1; a and b above 0. Out: 0 to 1, good to about 12 digits.
 * Source: NIST Digital Library of Mathematical Functions 2010, section 8.17.
 */
export function betaBelow(x: number, a: number, b: number): number {
	if (x <= 0) return 0;
	if (x >= 1) return 1;
	const weight = logGamma(a + b) - logGamma(a) - logGamma(b);
	const front = Math.exp(weight + a * Math.log(x) + b * Math.log1p(-x));
	if (x < (a + 1) / (a + b + 2)) return (front * fraction(x, a, b)) / a;
	return 1 - (front * fraction(1 - x, b, a)) / b;
}

/**
 * Where a share of a Beta(a, b) lies at or below: its quantile. In: the share 0 to 1; a and b 0 or
 * more, not both 0 (a = 0 is certainly 0, b = 0 certainly 1). Out: 0 to 1.
 */
export function betaQuantile(share: number, a: number, b: number): number {
	if (a === 0) return 0;
	if (b === 0) return 1;
	return placeOf((x) => betaBelow(x, a, b), share, 0, 1);
}

/**
 * Quantile of Student's t. In: the share above 0 and below 1; degrees of freedom above 0.
 * Out: how many scales from the middle.
 */
export function studentQuantile(share: number, freedom: number): number {
	if (share === 0.5) return 0;
	const outside = 2 * Math.min(share, 1 - share);
	const x = betaQuantile(outside, freedom / 2, 0.5);
	const size = Math.sqrt((freedom * (1 - x)) / Math.max(x, TINY));
	return share < 0.5 ? -size : size;
}
