import type { Decision, DecisionInput, Tip } from '$lib/worth';

/** What the shop may say of one donor; the rest counts as usual for its class and its cause. */
export type GivenFigures = Partial<
	Pick<
		DecisionInput,
		'fixChance' | 'fixedPriceCents' | 'newPartsCents' | 'labourCents' | 'wholePriceCents'
	>
>;

/** The five choices for a donor, best first. */
export interface ChoicesView extends Decision {
	/** At which cost of the whole repair, parts and labour, another choice becomes the best. */
	repairTips: Tip[];
	/** Null for those who may not see the terms. */
	figures: DecisionInput | null;
	/** Which of them were given, not usual. */
	given: string[];
}
