import { FAMILY_FACTOR, type FamilyMark } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import { standsBefore, type CauseId, type EngineClass } from '$lib/trade';
import {
	decide,
	pulledOnCall,
	reach,
	yearlyToContinuous,
	type DecisionInput,
	type GainInput
} from '$lib/worth';
import type { ChoicesView, GivenFigures } from './choices-view';
import {
	ENGINE_FIGURES,
	ENGINE_SCRAP,
	HANDLING_MINUTES,
	REPAIRS,
	REVIEW_YEARS
} from './engine-figures';
import { figuresOf } from './kind-figures';
import type { ShopFigures } from './learned-view';
import { roughlyPriced } from './plan';
import { neverReason } from './verdict';
import { chanceOf, gainInput, priceAt, pricedGrade, scrapKgCents } from './verdict-inputs';
import type { VerdictSubject } from './verdict-view';

export interface DonorToDecide {
	engineClass: EngineClass;
	cause: CauseId | null;
	secondCause: CauseId | null;
	family: FamilyMark;
	/** The kinds still on it, as if each were pulled now. */
	subjects: readonly VerdictSubject[];
	/** Total of its pull plan without a limit. */
	stripTotalCents: number;
}

const theta = (policy: ShopFigures) => ({
	moneyRate: yearlyToContinuous(policy.moneyRate, 'money'),
	dyingRate: yearlyToContinuous(policy.dyingRate, 'dying')
});

/** Of two causes the repair is as bad as the worse, and needs both. */
function repairOf({ cause, secondCause }: DonorToDecide) {
	const first = REPAIRS[cause ?? 'unknown'];
	const second = secondCause ? REPAIRS[secondCause] : { chance: 1, partsShare: 0, minutes: 0 };
	return {
		chance: Math.min(first.chance, second.chance),
		partsShare: first.partsShare + second.partsShare,
		minutes: first.minutes + second.minutes
	};
}

/** Pulled only when called, out of the yard: it dies as its donor does. */
function onCall(
	subject: VerdictSubject,
	there: readonly string[],
	policy: ShopFigures,
	season: Season
): number {
	const chance = chanceOf(subject, policy);
	if (neverReason(subject, chance)) return 0;
	const grade = pricedGrade(subject, chance.level);
	const { usedCents } = priceAt(grade, roughlyPriced(subject).price, policy);
	const input: GainInput = { ...gainInput(subject, policy, season, usedCents), ...theta(policy) };
	const alone = [...standsBefore(subject.kind, there), subject.kind];
	const minutesAlone = alone.reduce((sum, id) => sum + figuresOf(id, policy).pullMinutes, 0);
	return pulledOnCall({ ...input, minutesAlone }).cents;
}

/** How surely and soon an engine of the family is called for. */
function engineReach(callsPerYear: number, family: FamilyMark, policy: ShopFigures): number {
	const calls = callsPerYear * FAMILY_FACTOR[family];
	return reach({ ...theta(policy), callsPerYear: calls, place: 1, waiting: 0 });
}

/** Every figure of the decision: what was given, the rest as usual for its class and its cause. */
export function decisionFigures(
	donor: DonorToDecide,
	policy: ShopFigures,
	season: Season,
	given: GivenFigures = {}
): DecisionInput {
	const engine = ENGINE_FIGURES[donor.engineClass];
	const repair = repairOf(donor);
	const there = donor.subjects.map(({ kind }) => kind);
	const minute = policy.labourHourCents[season] / 60;
	return {
		fixChance: given.fixChance ?? repair.chance,
		fixedPriceCents: given.fixedPriceCents ?? engine.runningCents,
		fixReach: engineReach(engine.runningCallsPerYear, donor.family, policy),
		newPartsCents: given.newPartsCents ?? Math.round(engine.runningCents * repair.partsShare),
		labourCents: given.labourCents ?? Math.round(repair.minutes * minute),
		parkCents: donor.subjects.reduce((sum, one) => sum + onCall(one, there, policy, season), 0),
		yardCents: engine.yardYearCents * REVIEW_YEARS,
		stripTotalCents: Math.max(0, donor.stripTotalCents),
		wholePriceCents: given.wholePriceCents ?? engine.deadCents,
		wholeReach: engineReach(engine.deadCallsPerYear, donor.family, policy),
		handlingCents: Math.round(HANDLING_MINUTES * minute),
		scrapAllCents: Math.round((engine.grams / 1000) * scrapKgCents(ENGINE_SCRAP, policy)),
		disposalCents: 0
	};
}

/**
 * Fix, park, strip, sell whole or scrap: the five choices for a donor, best first, and what would
 * tip them. In: the donor, the shop's policy, the season, the figures that a person gave for it.
 */
export function choicesOf(
	donor: DonorToDecide,
	policy: ShopFigures,
	season: Season,
	given: GivenFigures = {}
): ChoicesView {
	const figures = decisionFigures(donor, policy, season, given);
	const { newPartsCents, labourCents } = figures;
	// a repair tips it by what it costs altogether, not by either half
	const repair = { ...figures, newPartsCents: newPartsCents + labourCents, labourCents: 0 };
	const whole = decide(repair).tips.filter(({ input }) => input === 'newPartsCents');
	return {
		...decide(figures),
		repairTips: whole,
		figures,
		given: Object.keys(given).filter((name) => given[name as keyof GivenFigures] !== undefined)
	};
}
