const LANCZOS: readonly number[] = [
	0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313,
	-176.61502916214059, 12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6,
	1.5056327351493116e-7
];

// x ln x - x + ... : Stirling's tail keeps its digits where x is large
function stirling(x: number): number {
	const over = 1 / (x * x);
	const tail = (1 / 12 - over * (1 / 360 - over * (1 / 1260 - over / 1680))) / x;
	return (x - 0.5) * Math.log(x) - x + 0.5 * Math.log(2 * Math.PI) + tail;
}

/**
 * Natural logarithm of the gamma function. In: x above 0. Good to about 14 digits.
 * Source: Lanczos 1964, "A Precision Approximation of the Gamma Function"; Stirling's series above 20.
 */
export function logGamma(x: number): number {
	if (x >= 20) return stirling(x);
	if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
	const at = x - 1;
	const sum = LANCZOS.reduce((sofar, each, index) =>
		index === 0 ? each : sofar + each / (at + index)
	);
	const top = at + 7.5;
	return 0.5 * Math.log(2 * Math.PI) + (at + 0.5) * Math.log(top) - top + Math.log(sum);
}
