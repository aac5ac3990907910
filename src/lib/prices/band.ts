import { findKind } from '$lib/trade';

/**
 * What to say about a new price outside what most of its kind cost; null when it lies within.
 * It warns and never refuses: a price seen is a price seen.
 */
export function oddPrice(
	price: { kind: string; newCents: number },
	say: (cents: number) => string
): string | null {
	const kind = findKind(price.kind);
	if (!kind || kind.newHighCents === 0) return null;
	if (price.newCents >= kind.newLowCents && price.newCents <= kind.newHighCents) return null;
	return `Most new ones of “${kind.name}” cost ${say(kind.newLowCents)} to ${say(kind.newHighCents)}: this one is ${say(price.newCents)}. Look again whether it is right.`;
}
