import type { Season } from '$lib/people/settings';
import { kind, standsBefore, type EngineClass } from '$lib/trade';
import { pullPlan, type PullPart, type PullStep } from '$lib/worth';
import { figuresOf } from './kind-figures';
import type { ShopFigures } from './learned-view';
import type { PlanBelow, PlanStep, PlanView } from './plan-view';
import { verdictOf } from './verdict';
import type { VerdictPrice, VerdictSubject } from './verdict-view';

const MACHINE = 'Machine parts (common)';
/** Engines that are taken in with the machine around them. */
const WITH_MACHINE: readonly EngineClass[] = ['SA', 'TR', 'GE', 'PW'];

/**
 * The kinds to plan with: an engine is taken in without the mower or the snow thrower around it, so
 * parts of those count only where the shop has a price for them on it or somebody waits for one.
 */
export const plannable = (subjects: readonly VerdictSubject[], engineClass: EngineClass) =>
	subjects.filter(
		(one) =>
			one.price !== null ||
			one.waiting ||
			kind(one.kind).system !== MACHINE ||
			WITH_MACHINE.includes(engineClass)
	);

/** The price in the middle of what new ones of a kind cost; such bands are wide, so by ratio. */
function middlePrice(kindId: string): VerdictPrice {
	const { newLowCents, newHighCents } = kind(kindId);
	return {
		newCents: Math.round(Math.sqrt(newLowCents * newHighCents)),
		copyCents: null,
		source: 'middle of its kind',
		seenOn: '2000-01-01',
		stale: false
	};
}

/** The same with a price, if need be the middle of its kind's. */
export const roughlyPriced = (subject: VerdictSubject) => ({
	...subject,
	price: subject.price ?? middlePrice(subject.kind)
});

/** A part once it is off: its gain before any minutes for pulling it. */
export interface PlanPart {
	id: string;
	gainCents: number;
	/** Counted at the middle of what its kind costs: it has no price yet. */
	rough: boolean;
	never: boolean;
	waitingFor: string | null;
}

/** What keeping a kind of this donor is worth once it is off; one without a price counts roughly. */
export function planPart(subject: VerdictSubject, policy: ShopFigures, season: Season): PlanPart {
	const off = { ...subject, stillOn: false };
	const { verdict, waitingFor } = verdictOf(off, policy, season, false);
	const id = subject.kind;
	if (verdict === 'never') return { id, gainCents: 0, rough: false, never: true, waitingFor: null };
	const { gainCents } = verdictOf(roughlyPriced(off), policy, season, false);
	const rough = subject.price === null;
	return { id, gainCents: gainCents ?? 0, rough, never: false, waitingFor };
}

function toPull({ id, gainCents }: PlanPart, policy: ShopFigures): PullPart {
	const { behind, partOf, ruins } = kind(id);
	const { pullMinutes: minutes } = figuresOf(id, policy);
	return { id, behind, partOf, ruins, minutes, keepMinutes: policy.keepMinutes, gainCents };
}

const nameOf = (id: string) => kind(id).name;

/** The whole of a piece, where that whole is kept. */
function wholeOf(id: string, kept: readonly string[]): string | null {
	const whole = kept.find((each) => kind(id).partOf === each);
	return whole === undefined ? null : nameOf(whole);
}

const spoilersOf = (spoiled: string, order: readonly PullStep[]) =>
	order.map(({ id }) => id).filter((id) => kind(id).ruins?.includes(spoiled));

/** What a part that stays on is sacrificed for, or would be the end of. */
const sacrifices = (id: string, order: readonly PullStep[], kept: readonly string[]) => ({
	sacrificedFor: spoilersOf(id, order).map(nameOf),
	spoils: kept.filter((each) => kind(id).ruins?.includes(each)).map(nameOf)
});

/** What a part that comes off without being kept is taken off for. */
function whyOff(part: PlanPart, order: readonly PullStep[], there: readonly string[]) {
	const at = order.findIndex(({ id }) => id === part.id);
	const kept = order.filter(({ keep }) => keep).map(({ id }) => id);
	const opens = order
		.slice(at + 1)
		.filter(({ id, keep }) => keep && standsBefore(id, there).includes(part.id))
		.map(({ id }) => nameOf(id));
	const spoilers = spoilersOf(part.id, order);
	const pieces = kept.filter((id) => kind(id).partOf === part.id);
	const givenUpFor = part.gainCents > 0 ? [...spoilers, ...pieces].map(nameOf) : [];
	return { opens, givenUpFor, goesWith: part.never ? null : wholeOf(part.id, kept) };
}

/**
 * The pull plan of a donor for the minutes at hand, in words for people.
 * In: the kinds still on it as if each were pulled now, the shop's policy, the season, and the
 * minutes (none: no limit). Out: what to take off in working order with running minutes and cents,
 * and what stays on below the stop line with what adding it would take and bring.
 */
export function planOf(
	subjects: readonly VerdictSubject[],
	policy: ShopFigures,
	season: Season,
	minutes: number | null = null
): PlanView {
	const parts = subjects.map((subject) => planPart(subject, policy, season));
	const known = new Map(parts.map((part) => [part.id, part]));
	const there = parts.map(({ id }) => id);
	const plan = pullPlan({
		parts: parts.map((part) => toPull(part, policy)),
		minutes,
		labourNow: policy.labourHourCents[season] / 60
	});
	const kept = plan.order.filter(({ keep }) => keep).map(({ id }) => id);
	const order = plan.order.map((step): PlanStep => {
		const part = known.get(step.id)!;
		const why = step.keep
			? { opens: [], givenUpFor: [], goesWith: null }
			: whyOff(part, plan.order, there);
		const rough = step.keep && part.rough;
		return { ...step, ...why, kindName: nameOf(step.id), rough, waitingFor: part.waitingFor };
	});
	const below = plan.below.flatMap((left): PlanBelow[] => {
		const part = known.get(left.id)!;
		if (part.never) return [];
		const goesWith = wholeOf(left.id, kept);
		const { rough, waitingFor } = part;
		const said = { kindName: nameOf(left.id), rough, goesWith, waitingFor };
		return [{ ...left, ...said, ...sacrifices(left.id, plan.order, kept) }];
	});
	const unpriced = parts.filter(({ rough }) => rough).length;
	return { ...plan, minutesAtHand: minutes, order, below, unpriced };
}
