import { DEFAULT_POLICY } from '$lib/people/policy';
import {
	kindsOn,
	scrapCentsPerGram,
	type EngineClass,
	type Fitting,
	type Kind,
	type Level
} from '$lib/trade';
import { yearlyToContinuous } from '$lib/worth';
import { asked, newPrice } from './asking';
import { draws, type Draws } from './random';
import type { Scenario } from './scenario';
import { NORMAL_RATE } from './season';
import { kindTruth, type KindTruth, type TruthName } from './truth';

/** One kind for one engine family: what the same call asks for and the same part answers. */
export interface Item {
	at: number;
	kind: Kind;
	newCents: number;
	/** What a used part may ask beside a copy; none to be had: no limit. */
	capCents: number;
	/** What customers pay for it, on average. */
	usedCents: Readonly<Record<Level, number>>;
	scrapCents: number;
	shelfCents: number;
	dyingRate: number;
	/** Calls a year as the kind and the mark of the family say. */
	usualCalls: number;
	/** How the family is marked: times the calls of an ordinary one. */
	mark: number;
	trueCalls: number;
	trueChance: Readonly<Record<Level, number>>;
	comeBackCents: number;
}

export interface Family {
	engineClass: EngineClass;
	fittings: readonly Fitting[];
	items: readonly Item[];
}

const FITTED: Readonly<Record<EngineClass, readonly Fitting[]>> = {
	WB: ['recoil'],
	GP: ['recoil'],
	R1: ['12 V start', 'charging'],
	R2: ['12 V start', 'charging', 'two cylinders'],
	SN: ['recoil', 'mains start'],
	GE: ['recoil', '12 V start', 'charging'],
	SA: ['recoil'],
	TR: ['recoil'],
	PW: ['recoil']
};

interface Where {
	scenario: Scenario;
	mark: number;
	dearness: number;
	truths: ReadonlyMap<string, KindTruth>;
	from: Draws;
}

function makeItem(kind: Kind, at: number, { scenario, mark, dearness, truths, from }: Where): Item {
	const newCents = newPrice(kind, dearness, from);
	const copied = from.next() < scenario.copies.chance;
	const share = scenario.copies.low + from.next() * (scenario.copies.high - scenario.copies.low);
	const copyCents = copied ? Math.round(newCents * share) : null;
	const truth = truths.get(kind.id) ?? { calls: 1, chances: DEFAULT_POLICY.chances, spread: 0 };
	const aside = Math.exp(truth.spread * from.normal() - truth.spread ** 2 / 2);
	const dying = kind.ages ? DEFAULT_POLICY.dyingRateAgeing : DEFAULT_POLICY.dyingRate;
	return {
		at,
		kind,
		newCents,
		capCents: copyCents === null ? Infinity : copyCents * DEFAULT_POLICY.copyCap,
		usedCents: asked(newCents, copyCents),
		scrapCents: ((kind.massLowGrams + kind.massHighGrams) / 2) * scrapCentsPerGram(kind.scrapClass),
		shelfCents: DEFAULT_POLICY.shelfCents[kind.size],
		dyingRate: yearlyToContinuous(dying, 'dying'),
		usualCalls: kind.callsPerYear * mark,
		mark,
		trueCalls: kind.callsPerYear * mark * truth.calls * aside,
		trueChance: truth.chances,
		comeBackCents: kind.refitMinutes * NORMAL_RATE
	};
}

/** The engine families that come through this shop, with what everything costs for them. */
export function market(scenario: Scenario, truth: TruthName, seed: number): Family[] {
	const truths = new Map<string, KindTruth>();
	let items = 0;
	return Array.from({ length: scenario.families }, (_, family) => {
		const from = draws(seed, scenario.name, 'family', family);
		const engineClass = from.weighted(scenario.classes);
		const fittings = FITTED[engineClass];
		const where = { scenario, mark: from.weighted(scenario.marks), dearness: from.next(), truths };
		const kinds = kindsOn(engineClass, fittings);
		for (const { id } of kinds)
			if (!truths.has(id)) truths.set(id, kindTruth(truth, draws(seed, 'kind', id)));
		return {
			engineClass,
			fittings,
			items: kinds.map((kind) =>
				makeItem(kind, items++, { ...where, from: draws(seed, scenario.name, family, kind.id) })
			)
		};
	});
}
