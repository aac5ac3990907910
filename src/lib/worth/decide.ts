import { decisionFigures, type DecisionInput } from './decide-input';
import { check } from './figures';
import { wholeCents } from './money';

export type ChoiceName = 'fix' | 'park' | 'strip' | 'whole' | 'scrap';

/** At this value of the input, the others as they are, another choice becomes the best. */
export interface Tip {
	input: keyof DecisionInput;
	at: number;
	choice: ChoiceName;
	/** Whether it takes over above the value or below it. */
	when: 'above' | 'below';
}

export interface Decision {
	choices: { choice: ChoiceName; cents: number }[];
	tips: Tip[];
}

// of equal ones the less trouble first
const CHOICES: readonly ChoiceName[] = ['scrap', 'whole', 'park', 'strip', 'fix'];

function valuesOf(donor: DecisionInput): Record<ChoiceName, number> {
	const scrap = donor.scrapAllCents - donor.disposalCents;
	return {
		scrap,
		whole: donor.wholePriceCents * donor.wholeReach - donor.handlingCents,
		park: donor.parkCents + donor.scrapAllCents - donor.yardCents,
		strip: donor.stripTotalCents + scrap,
		fix:
			donor.fixChance * donor.fixedPriceCents * donor.fixReach +
			(1 - donor.fixChance) * donor.scrapAllCents -
			donor.newPartsCents -
			donor.labourCents
	};
}

/** Each choice is a straight line in every single input: its value there and its slope. */
function slopes(donor: DecisionInput, input: keyof DecisionInput): Record<ChoiceName, number> {
	const low = valuesOf({ ...donor, [input]: 0 });
	const high = valuesOf({ ...donor, [input]: 1 });
	const slope = (choice: ChoiceName) => high[choice] - low[choice];
	return Object.fromEntries(CHOICES.map((choice) => [choice, slope(choice)])) as typeof low;
}

function tipsOf(donor: DecisionInput, input: keyof DecisionInput, best: ChoiceName): Tip[] {
	const values = valuesOf(donor);
	const rise = slopes(donor, input);
	const most = decisionFigures[input].most ?? 1e12;
	const crossings = CHOICES.flatMap((choice): Tip[] => {
		const catching = rise[choice] - rise[best];
		if (choice === best || Math.abs(catching) < 1e-12) return [];
		const at = donor[input] + (values[best] - values[choice]) / catching;
		if (at < 0 || at > most) return [];
		return [{ input, at, choice, when: catching > 0 ? 'above' : 'below' }];
	});
	const nearest = (when: Tip['when']) =>
		crossings
			.filter((tip) => tip.when === when)
			.sort((a, b) => Math.abs(a.at - donor[input]) - Math.abs(b.at - donor[input]))
			.slice(0, 1);
	return [...nearest('below'), ...nearest('above')];
}

/**
 * The five choices for a donor, best first, and what would tip them: for each input the nearest
 * value, below and above, at which another choice becomes the best, in closed form. Fixing bears the
 * chance that the repair fails and scrap is left; parking pays the yard and pulls on call; stripping
 * adds the pull plan to the scrap; whole waits for a buyer of the dead engine.
 * In: see DecisionInput. Out: choices in whole cents, of equal ones the less trouble first; tips in
 * the unit of the input and unrounded, none where no value in its range tips it.
 * Throws WorthError naming the field.
 */
export function decide(input: DecisionInput): Decision {
	check(input, decisionFigures);
	const values = valuesOf(input);
	const ranked = [...CHOICES].sort((a, b) => values[b] - values[a]);
	const best = ranked[0] ?? 'scrap';
	const inputs = Object.keys(decisionFigures) as (keyof DecisionInput)[];
	return {
		choices: ranked.map((choice) => ({ choice, cents: wholeCents(values[choice]) })),
		tips: inputs.flatMap((each) => tipsOf(input, each, best))
	};
}
