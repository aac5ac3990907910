import { DEFAULT_POLICY, type KindFigures, type Policy } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import type { ChanceGood } from '$lib/trade';
import type { Gain, GainInput, UsedPrice } from '$lib/worth';
import type { ShopFigures } from './learned-view';
import type { VerdictSubject } from './verdict-view';
import type { Grade } from './words';

/** Everything a verdict was made of. `used` is null where there is no price. */
export interface Basis {
	subject: VerdictSubject;
	policy: ShopFigures;
	season: Season;
	chance: ChanceGood;
	grade: Grade;
	used: UsedPrice | null;
	worked: { input: GainInput; gain: Gain };
}

export const OWN = "the shop's own";
const DEFAULT = 'policy default';

/** Whether a figure of the policy is the default or what the shop put in its place. */
export const from = (policy: Policy, pick: (policy: Policy) => unknown): string =>
	JSON.stringify(pick(policy)) === JSON.stringify(pick(DEFAULT_POLICY)) ? DEFAULT : OWN;

export const fromKind = (basis: Basis, ...fields: (keyof KindFigures)[]): string =>
	fields.some((field) => basis.policy.kinds[basis.subject.kind]?.[field] !== undefined)
		? OWN
		: "the kind's usual";

/** The source of a figure with what stands behind it here. */
export const taught = (source: string, seen: string): string =>
	seen ? `${source}; ${seen}` : source;

export const SEASON_SAID: Record<Season, string> = {
	normal: 'at the normal rate',
	slow: 'in the slow season',
	rush: 'in the rush'
};
