import type { Season } from '$lib/people/settings';
import { causeSaid, chanceLevel, kind, whyChance, type ChanceGood } from '$lib/trade';
import { gain, verdictWord, type Gain, type GainInput, type VerdictWord } from '$lib/worth';
import { shareFor } from './learned';
import type { ShopFigures } from './learned-view';
import { chanceOf, gainInput, isTested, priceAt, pricedGrade } from './verdict-inputs';
import { verdictTerms } from './verdict-terms';
import type { Verdict, VerdictPrice, VerdictSubject } from './verdict-view';
import type { Grade } from './words';

/** Why it is never stock: its kind, or a cause that ruined it; null when it may be. */
export function neverReason(
	subject: VerdictSubject,
	chance: Pick<ChanceGood, 'ruined'>
): string | null {
	const { name, reuse, reason } = kind(subject.kind);
	if (reuse === 'never') return `${name}: never used again. ${reason}.`;
	if (!chance.ruined) return null;
	const cause = [subject.cause, subject.secondCause].find(
		(each) => each && chanceLevel(subject.kind, each) === 'ruined'
	);
	if (!cause) return `${name}: ruined.`;
	const why = whyChance(subject.kind, cause);
	return `Its donor: ${causeSaid(cause)}. That ruins this part.${why ? ` ${why}` : ''}`;
}

interface Worked {
	input: GainInput;
	gain: Gain;
}

function work(
	subject: VerdictSubject,
	policy: ShopFigures,
	season: Season,
	usedCents: number
): Worked {
	const input = gainInput(subject, policy, season, usedCents);
	return { input, gain: gain(input) };
}

/** The lowest new price at which keeping pays; none where the cap of the copy binds first. */
function lowestNew(
	evenUsedCents: number | null,
	grade: Grade,
	copyCents: number | null,
	policy: ShopFigures
): { cents: number | null; copyBinds: boolean } {
	const share = shareFor(grade, policy);
	if (evenUsedCents === null || share === 0) return { cents: null, copyBinds: false };
	const copyBinds = copyCents !== null && policy.copyCap * copyCents < evenUsedCents;
	return { cents: copyBinds ? null : Math.ceil(evenUsedCents / share - 1e-6), copyBinds };
}

/** Keep, close call or let it go at either end of what new ones of the kind cost, where both agree. */
function roughWord(
	subject: VerdictSubject,
	policy: ShopFigures,
	season: Season,
	grade: Grade
): VerdictWord | null {
	const { newLowCents, newHighCents } = kind(subject.kind);
	const [low, high] = [newLowCents, newHighCents].map((newCents) => {
		const { usedCents } = priceAt(grade, { newCents, copyCents: null }, policy);
		const { gainCents } = work(subject, policy, season, usedCents).gain;
		return verdictWord({ gainCents, marginCents: policy.marginCents });
	});
	return low === high ? (low ?? null) : null;
}

function common(subject: VerdictSubject, grade: Grade, worked: Worked, policy: ShopFigures) {
	const { price, have, place } = subject;
	const { breakEvenUsedCents, waitYears, everCalled } = worked.gain;
	const lowest = lowestNew(breakEvenUsedCents, grade, price?.copyCents ?? null, policy);
	return {
		have,
		place,
		askedGrade: grade,
		newCents: price?.newCents ?? null,
		copyCents: price?.copyCents ?? null,
		breakEvenUsedCents,
		breakEvenNewCents: lowest.cents,
		copyBinds: lowest.copyBinds,
		stale: price?.stale ?? false,
		scrapCents: Math.round(worked.input.scrapCents),
		waitYears,
		everCalled,
		waitingFor: (subject.waiting && subject.waitingFor) || null
	};
}

const UNPRICED = {
	gainCents: null,
	timing: null,
	keepUpTo: null,
	askedCents: null,
	untestedCents: null,
	belowLeast: false,
	figures: null
} as const;

function priced(
	subject: VerdictSubject & { price: VerdictPrice },
	policy: ShopFigures,
	season: Season,
	chance: ChanceGood,
	grade: Grade,
	withTerms: boolean
): Verdict {
	const used = priceAt(grade, subject.price, policy);
	const worked = work(subject, policy, season, used.usedCents);
	const { gainCents, timing, keepUpTo, terms } = worked.gain;
	const waits = grade !== subject.grade;
	return {
		...common(subject, grade, worked, policy),
		verdict: verdictWord({ gainCents, marginCents: policy.marginCents }),
		reason: null,
		gainCents,
		timing: isTested(subject) || worked.input.minutesLater === 0 ? null : timing,
		keepUpTo,
		askedCents: used.usedCents,
		untestedCents: waits ? priceAt('untested', subject.price, policy).usedCents : null,
		rough: null,
		belowLeast: used.belowLeast,
		terms: withTerms ? verdictTerms({ subject, policy, season, chance, grade, used, worked }) : [],
		figures: { input: worked.input, terms }
	};
}

/**
 * The verdict on one part by the shop's policy: never, needs a price, or what the gain says.
 * In: the part with its place in the queue and the price that counts for it, the whole policy with
 * what the shop's history has taught it, the season. Out: amounts in cents, the terms of the sum with their
 * sources unless a list does without. Throws RangeError on an
 * unknown kind or cause.
 */
export function verdictOf(
	subject: VerdictSubject,
	policy: ShopFigures,
	season: Season,
	withTerms = true
): Verdict {
	const chance = chanceOf(subject, policy);
	const grade = pricedGrade(subject, chance.level);
	const reason = neverReason(subject, chance);
	if (!reason && subject.price)
		return priced({ ...subject, price: subject.price }, policy, season, chance, grade, withTerms);
	const worked = work(subject, policy, season, 0);
	const base = { ...UNPRICED, ...common(subject, grade, worked, policy), reason };
	if (reason)
		return {
			...base,
			verdict: 'never',
			rough: null,
			breakEvenUsedCents: null,
			breakEvenNewCents: null,
			copyBinds: false,
			terms: []
		};
	return {
		...base,
		verdict: 'needs a price',
		rough: roughWord(subject, policy, season, grade),
		terms: withTerms
			? verdictTerms({ subject, policy, season, chance, grade, used: null, worked })
			: []
	};
}
