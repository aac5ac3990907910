import { placeAbove } from './invert';
import { logGamma } from './log-gamma';

const TINY = 1e-300;
const MOST_TERMS = 20_000;

function bySeries(shape: number, x: number): number {
	let term = 1 / shape;
	let sum = term;
	for (let n = 1; n < MOST_TERMS && term > sum * 1e-17; n += 1) {
		term *= x / (shape + n);
		sum += term;
	}
	return sum;
}

// what lies above, as a continued fraction by Lentz's method
function byFraction(shape: number, x: number): number {
	let b = x + 1 - shape;
	let c = 1 / TINY;
	let d = 1 / b;
	let value = d;
	for (let n = 1; n < MOST_TERMS; n += 1) {
		const a = -n * (n - shape);
		b += 2;
		d = 1 / (Math.abs(a * d + b) < TINY ? TINY : a * d + b);
		c = Math.abs(b + a / c) < TINY ? TINY : b + a / c;
		value *= d * c;
		if (Math.abs(d * c - 1) < 1e-16) break;
	}
	return value;
}

/**
 * The share of a Gamma of this shape and rate 1 that lies at or below x: the regularised incomplete
 * gamma function. One less its value at shape k + 1 is the chance that Poisson calls of mean x are
 * k at most. In: shape above 0, x 0 or more. Out: 0 to 1, good to about 12 digits.
 * Source: NIST Digital Library of Mathematical Functions 2010, section 8.
 */
export function gammaBelow(x: number, shape: number): number {
	if (x <= 0) return 0;
	if (x === Infinity) return 1;
	const front = Math.exp(shape * Math.log(x) - x - logGamma(shape));
	if (x < shape + 1) return Math.min(1, front * bySeries(shape, x));
	return 1 - front * byFraction(shape, x);
}

/**
 * Quantile of a Gamma. In: the share 0 to below 1; shape 0 or more (0 is certainly 0); rate above 0.
 * Out: 0 or more, in the unit of one over the rate.
 */
export function gammaQuantile(share: number, shape: number, rate: number): number {
	if (shape === 0 || share <= 0) return 0;
	return placeAbove((x) => gammaBelow(x, shape), share, shape + 1) / rate;
}
