export const PROOF_HOWS = [
	'look-over',
	'seen running',
	'worked in place',
	'bench test cold',
	'bench test hot'
] as const;
export type ProofHow = (typeof PROOF_HOWS)[number];

export interface Proof {
	how: ProofHow;
	passed: boolean;
}

/** How many times the odds of being good grow with a passed proof: from memory, editable. */
export const DEFAULT_PROOF_ODDS: Readonly<Record<ProofHow, number>> = {
	'look-over': 1.5,
	'seen running': 6,
	'worked in place': 6,
	'bench test cold': 10,
	'bench test hot': 25
};

// a part that failed and was put right must pass a test again; a look does not lift a failure
function standing(proofs: readonly Proof[]): { failed: boolean; passed: readonly Proof[] } {
	const failedAt = proofs.findLastIndex((proof) => !proof.passed);
	const passed = proofs.slice(failedAt + 1);
	const lifted = passed.some((proof) => proof.how.startsWith('bench test'));
	return { failed: failedAt >= 0 && !lifted, passed };
}

/**
 * A chance after what was proved. Only the strongest passed proof counts: proofs of one part look
 * at the same thing, so their odds are not multiplied together. A failed one makes `failedChance`
 * until a bench test is passed after it. In: chance 0 to 1, proofs oldest first. Out: the new
 * chance and its reason in words, or null without any proof.
 */
export function afterProofs(
	chance: number,
	proofs: readonly Proof[],
	odds: Readonly<Record<ProofHow, number>>,
	failedChance: number
): { said: string; value: number } | null {
	const { failed, passed } = standing(proofs);
	if (failed) return { said: 'failed its test', value: failedChance };
	const strongest = passed.reduce<Proof | null>(
		(best, proof) => (best && odds[best.how] >= odds[proof.how] ? best : proof),
		null
	);
	if (!strongest) return null;
	const times = odds[strongest.how];
	const value = (chance * times) / (1 - chance + chance * times);
	return { said: `${strongest.how} passed: odds times ${times}`, value };
}
