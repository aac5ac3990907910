import { causeSaid, chanceLevel, worseLevel, type CauseId, type Level } from './causes';
import { afterProofs, type Proof, type ProofHow } from './proofs';

export type Sureness = 'seen' | 'likely' | 'told';
export type Chances = Readonly<Record<Level, number>>;
export type ProofOdds = Readonly<Record<ProofHow, number>>;

/** Defaults from memory; a shop may edit every one. */
export const DEFAULT_CHANCES: Chances = { high: 0.9, medium: 0.6, low: 0.2, ruined: 0.02 };

export interface ChanceInput {
	kindId: string;
	/** null: old stock, or not known yet */
	cause: CauseId | null;
	secondCause?: CauseId | null;
	sureness?: Sureness | null;
	/** oldest first */
	proofs: readonly Proof[];
	chances: Chances;
	proofOdds: ProofOdds;
}

export interface ChanceGood {
	chance: number;
	level: Level;
	ruined: boolean;
	terms: { said: string; value: number }[];
}

function checkFigures(input: ChanceInput): void {
	for (const [level, chance] of Object.entries(input.chances)) {
		if (!(chance >= 0 && chance <= 1)) throw new RangeError(`chance ${level}: from 0 to 1`);
	}
	for (const [how, odds] of Object.entries(input.proofOdds)) {
		if (!(odds > 0 && Number.isFinite(odds))) throw new RangeError(`odds ${how}: above 0`);
	}
}

function levelOf(input: ChanceInput): Level {
	const first = chanceLevel(input.kindId, input.cause ?? 'unknown');
	if (!input.secondCause) return first;
	return worseLevel(first, chanceLevel(input.kindId, input.secondCause));
}

function causesSaid(input: ChanceInput): string {
	const first = causeSaid(input.cause ?? 'unknown');
	return input.secondCause ? `${first}; and ${causeSaid(input.secondCause)}` : first;
}

/**
 * The chance that a part is good, before the test still to come: what the causes leave of its kind
 * (two causes: the worse; none: as not known), the middle between that and "not known yet" where a
 * customer only told the cause, then what was proved. Ruined stays ruined, told or not, proved or
 * not: safety does not wait for certainty.
 * In: ids, proofs oldest first, the shop's chances (0 to 1) and odds (above 0). Out: the chance 0
 * to 1, the level by cause, whether it is ruined, and the steps in words. Throws RangeError on an
 * unknown id or a figure out of range. Common practice, no source.
 */
export function chanceGood(input: ChanceInput): ChanceGood {
	checkFigures(input);
	const level = levelOf(input);
	const ruined = level === 'ruined';
	const byCause = input.chances[level];
	const terms = [{ said: causesSaid(input), value: byCause }];
	if (ruined) return { chance: byCause, level, ruined, terms };
	let chance = byCause;
	if (input.sureness === 'told' && input.cause) {
		chance = (byCause + input.chances[chanceLevel(input.kindId, 'unknown')]) / 2;
		terms.push({ said: 'only told: the middle between that and not known', value: chance });
	}
	const proved = afterProofs(chance, input.proofs, input.proofOdds, input.chances.ruined);
	if (proved) terms.push(proved);
	return { chance: proved?.value ?? chance, level, ruined, terms };
}
