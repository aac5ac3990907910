import type { Policy } from '$lib/people/policy';
import type { Limits } from '$lib/trade';

/** The shop's own bounds for the test of a kind; what it did not set is the usual one. */
export const limitsOf = (policy: Policy, kindId: string): Limits => policy.limits[kindId] ?? {};
