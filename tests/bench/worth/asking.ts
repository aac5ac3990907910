import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Kind, Level } from '$lib/trade';
import { usedPrice } from '$lib/worth';
import type { Draws } from './random';

const GRADE = { high: 'clean used', medium: 'good used', low: 'usable', ruined: 'core' } as const;
export const shareOf = (level: Level): number => DEFAULT_POLICY.shares[GRADE[level]];

/** Within the kind's band, even on a logarithmic scale, dear families dear in everything. */
export function newPrice(kind: Kind, dearness: number, from: Draws): number {
	const at = Math.min(1, Math.max(0, dearness + 0.2 * from.normal()));
	return Math.round(kind.newLowCents * Math.pow(kind.newHighCents / kind.newLowCents, at));
}

/** What a used one asks at the counter, by what its death left of it. */
export function asked(newCents: number, copyCents: number | null): Record<Level, number> {
	const { copyCap, stepLimitCents, stepLowCents, stepHighCents, leastCents } = DEFAULT_POLICY;
	const at = (level: Level) =>
		usedPrice({
			newCents,
			copyCents,
			share: shareOf(level),
			copyCap,
			stepCents: [
				{ underCents: stepLimitCents, stepCents: stepLowCents },
				{ stepCents: stepHighCents }
			],
			leastCents
		}).usedCents;
	return { high: at('high'), medium: at('medium'), low: at('low'), ruined: 0 };
}
