import type { Policy } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import { chanceGood, kind, scrapCentsPerGram, type ChanceGood, type Level } from '$lib/trade';
import { usedPrice, yearlyToContinuous, type GainInput, type UsedPrice } from '$lib/worth';
import { figuresOf } from './kind-figures';
import { callsFor, chancesFor, comeBackFor, shareFor } from './learned';
import type { ShopFigures, TestsSeen } from './learned-view';
import type { VerdictSubject } from './verdict-view';
import type { Grade } from './words';

/** The grade that a part will have if it passes, by what its death left of it. */
const GRADE_IF_PASSED: Record<Level, Grade> = {
	high: 'clean used',
	medium: 'good used',
	low: 'usable',
	ruined: 'core'
};

/** The latest bench test of the part itself. */
export function ownTest(subject: VerdictSubject): TestsSeen | undefined {
	const last = subject.proofs.findLast(({ how }) => how.startsWith('bench test'));
	const { kind, cause, secondCause, sureness } = subject;
	const passed = Number(last?.passed ?? false);
	return last && { kind, cause, secondCause, sureness, passed, failed: 1 - passed };
}

export const chanceOf = (subject: VerdictSubject, policy: ShopFigures): ChanceGood =>
	chanceGood({
		kindId: subject.kind,
		cause: subject.cause,
		secondCause: subject.secondCause,
		sureness: subject.sureness,
		proofs: subject.proofs,
		chances: chancesFor(subject.kind, policy, ownTest(subject)),
		proofOdds: policy.proofOdds
	});

/** Whether its bench test is done: what was left to clean and test has been. */
export function isTested(subject: VerdictSubject): boolean {
	const last = subject.proofs.findLast(
		({ how, passed }) => !passed || how.startsWith('bench test')
	);
	return last?.passed ?? false;
}

/** A part that waits for its test is priced at the grade it will have if it passes. */
export const pricedGrade = (subject: VerdictSubject, level: Level): Grade =>
	subject.grade === 'untested' && !isTested(subject) ? GRADE_IF_PASSED[level] : subject.grade;

/** The used price of a grade by the shop's policy. */
export const priceAt = (
	grade: Grade,
	price: { newCents: number; copyCents: number | null },
	policy: ShopFigures
): UsedPrice =>
	usedPrice({
		newCents: price.newCents,
		copyCents: price.copyCents,
		share: shareFor(grade, policy),
		copyCap: policy.copyCap,
		stepCents: [
			{ underCents: policy.stepLimitCents, stepCents: policy.stepLowCents },
			{ stepCents: policy.stepHighCents }
		],
		leastCents: policy.leastCents
	});

/** Cents a kilogram that the yard pays for a metal class. */
export const scrapKgCents = (scrapClass: string, policy: Policy): number =>
	policy.scrapKgCents[scrapClass] ?? scrapCentsPerGram(scrapClass) * 1000;

/** The yearly cost of the room that it takes: by litres where both are known, else by its size. */
export function shelfCents(
	subject: VerdictSubject,
	policy: Policy
): { cents: number; by: 'bin' | 'size' } {
	const { bin, litres } = subject;
	if (bin?.yearlyCostCents != null && bin.litres && litres)
		return { cents: Math.min(1, litres / bin.litres) * bin.yearlyCostCents, by: 'bin' };
	return { cents: policy.shelfCents[figuresOf(subject.kind, policy).size], by: 'size' };
}

/** The yearly share that becomes unsellable. */
export const dyingShare = (kindId: string, policy: Policy): number =>
	kind(kindId).ages ? policy.dyingRateAgeing : policy.dyingRate;

const UNENDING = 1e-6;

/** The figures of the gain, all but the used price that comes with it. */
export function gainInput(
	subject: VerdictSubject,
	policy: ShopFigures,
	season: Season,
	usedCents: number
): GainInput {
	const figures = figuresOf(subject.kind, policy);
	const callsPerYear = callsFor(subject, policy);
	const labour = policy.labourHourCents.normal / 60;
	const mass = subject.massGrams ?? figures.massGrams;
	const moneyRate = yearlyToContinuous(policy.moneyRate, 'money');
	const dyingRate = yearlyToContinuous(dyingShare(subject.kind, policy), 'dying');
	return {
		usedCents,
		chanceGood: chanceOf(subject, policy).chance,
		comeBack: comeBackFor(subject.kind, policy),
		comeBackCents: figures.refitMinutes * labour,
		kitCents: figures.kitCents,
		callsPerYear,
		place: subject.place,
		moneyRate,
		// a part that nobody calls for and that never dies out has no value to compute
		dyingRate: moneyRate + dyingRate === 0 && callsPerYear === 0 ? UNENDING : dyingRate,
		shelfCents: shelfCents(subject, policy).cents,
		scrapCents: (mass / 1000) * scrapKgCents(kind(subject.kind).scrapClass, policy),
		labourNow: policy.labourHourCents[season] / 60,
		labour,
		minutesNow: subject.stillOn ? figures.pullMinutes + policy.keepMinutes : 0,
		minutesLater: isTested(subject) ? 0 : figures.cleanMinutes + figures.testMinutes,
		waiting: subject.waiting ? policy.waitingChance : 0,
		workWhenCalledOnly: !kind(subject.kind).cleanKeeps
	};
}
