import type { KindFigures, Policy } from '$lib/people/policy';
import { kind } from '$lib/trade';

/** The figures of a kind as this shop counts with them. */
export type UsedFigures = Required<KindFigures>;

/** What a kind has by itself, before the shop says otherwise. */
export function usualFigures(kindId: string): UsedFigures {
	const { callsPerYear, comeBack, kitCents, pullMinutes, cleanMinutes, testMinutes, ...rest } =
		kind(kindId);
	const massGrams = (rest.massLowGrams + rest.massHighGrams) / 2;
	const { refitMinutes, size } = rest;
	return {
		callsPerYear,
		comeBack,
		kitCents,
		pullMinutes,
		cleanMinutes,
		testMinutes,
		refitMinutes,
		massGrams,
		size
	};
}

/** A kind's usual figures with the shop's own laid over them. */
export const figuresOf = (kindId: string, policy: Policy): UsedFigures => ({
	...usualFigures(kindId),
	...policy.kinds[kindId]
});
