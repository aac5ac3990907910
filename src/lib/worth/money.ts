/** Rounds to whole cents, once, at the edge; never gives minus zero. In, out: cents. */
export function wholeCents(cents: number): number {
	return Math.round(cents) || 0;
}

/** Takes binary noise off a product of a share and an amount before it meets a rounding step. */
export function withoutNoise(cents: number): number {
	return Math.round(cents * 1e6) / 1e6;
}
