import { FAMILY_FACTOR, type Policy } from '$lib/people/policy';
import type { Level } from '$lib/trade';
import { figuresOf } from './kind-figures';
import { calls } from './learn-calls';
import { chances, comeBacks, shares } from './learn-chances';
import type { Observed, ShopFigures, TestsSeen } from './learned-view';
import type { VerdictSubject } from './verdict-view';
import type { Grade } from './words';

/**
 * What a shop has seen, weighed against what its policy believes. In: counts of its own history and
 * its policy. Out: the policy with the learned figures beside it, chances and shares 0 to 1, calls
 * per year; n observations move a figure at most n / (n + what the belief is worth) of the way.
 */
export const withHistory = (policy: Policy, observed: Observed): Required<ShopFigures> => ({
	...policy,
	taught: {
		chance: chances(observed, policy),
		comeBack: comeBacks(observed, policy),
		calls: calls(observed, policy),
		share: shares(observed, policy)
	}
});

/** The chances of a kind by what its donor's death left of it. */
export function chancesFor(
	kindId: string,
	{ chances, taught }: Pick<ShopFigures, 'chances' | 'taught'>,
	less?: TestsSeen
) {
	if (!taught) return chances;
	const of = (level: Level) => taught.chance(kindId, level, less).mean;
	return { high: of('high'), medium: of('medium'), low: of('low'), ruined: chances.ruined };
}

export const shareFor = (grade: Grade, { shares, taught }: ShopFigures): number =>
	taught?.share(grade).mean ?? shares[grade];

export const comeBackFor = (kindId: string, figures: ShopFigures): number =>
	figures.taught?.comeBack(kindId).mean ?? figuresOf(kindId, figures).comeBack;

/** Calls a year for a kind on an engine; by its mark where the history says nothing. */
export function callsFor(
	{ kind, engineKey, family }: Pick<VerdictSubject, 'kind' | 'engineKey' | 'family'>,
	figures: ShopFigures
): number {
	const usual = figuresOf(kind, figures).callsPerYear * FAMILY_FACTOR[family];
	return figures.taught?.calls(kind, engineKey ?? '', family).mean ?? usual;
}
