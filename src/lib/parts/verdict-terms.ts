import { DEFAULT_POLICY, FAMILY_FACTOR, type KindFigures, type Policy } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import { seenSaid } from '$lib/prices/seen';
import { findScrapClass, kind, type ChanceGood } from '$lib/trade';
import type { Gain, GainInput, UsedPrice } from '$lib/worth';
import { figuresOf } from './kind-figures';
import { shareFor } from './learned';
import { callsTaught, shareTaught } from './learned-said';
import type { ShopFigures } from './learned-view';
import { dyingShare, isTested, ownTest, scrapKgCents, shelfCents } from './verdict-inputs';
import type { VerdictSubject, VerdictTerm } from './verdict-view';
import type { Grade } from './words';

/** Everything a verdict was made of. `used` is null where there is no price. */
export interface Basis {
	subject: VerdictSubject;
	policy: ShopFigures;
	season: Season;
	chance: ChanceGood;
	grade: Grade;
	used: UsedPrice | null;
	worked: { input: GainInput; gain: Gain };
}

const OWN = "the shop's own";
const DEFAULT = 'policy default';

/** Whether a figure of the policy is the default or what the shop put in its place. */
const from = (policy: Policy, pick: (policy: Policy) => unknown): string =>
	JSON.stringify(pick(policy)) === JSON.stringify(pick(DEFAULT_POLICY)) ? DEFAULT : OWN;

const fromKind = (basis: Basis, ...fields: (keyof KindFigures)[]): string =>
	fields.some((field) => basis.policy.kinds[basis.subject.kind]?.[field] !== undefined)
		? OWN
		: "the kind's usual";

/** The source of a figure with what stands behind it here. */
const taught = (source: string, seen: string): string => (seen ? `${source}; ${seen}` : source);

export const SEASON_SAID: Record<Season, string> = {
	normal: 'at the normal rate',
	slow: 'in the slow season',
	rush: 'in the rush'
};

function priceTerms({ subject, policy, grade, used }: Basis): VerdictTerm[] {
	const { price } = subject;
	if (!price || !used) return [];
	const stale = price.stale ? `, older than ${policy.staleDays} days` : '';
	const source = `${price.source}, seen ${seenSaid(price.seenOn)}${stale}`;
	const waits = grade !== subject.grade ? 'once tested as ' : '';
	const rows: VerdictTerm[] = [
		{ said: 'A new one costs', value: price.newCents, unit: 'cents', source },
		{
			said: `Share of new that it fetches ${waits}${grade}`,
			value: shareFor(grade, policy),
			unit: 'share',
			source: taught(
				from(policy, (p) => p.shares[grade]),
				shareTaught(policy.taught?.share(grade), 'sold')
			)
		}
	];
	if (price.copyCents !== null)
		rows.push(
			{ said: 'A copy costs', value: price.copyCents, unit: 'cents', source },
			{
				said: 'Share of a copy that a used one asks at most',
				value: policy.copyCap,
				unit: 'share',
				source: from(policy, (p) => p.copyCap)
			}
		);
	const capped = used.cappedBy ? 'held down by the copy, ' : '';
	const least = used.belowLeast ? '; under the least price of the counter' : '';
	rows.push({
		said: 'Asked price',
		value: used.usedCents,
		unit: 'cents',
		source: `${capped}rounded to the step${least}`,
		sum: true
	});
	return rows;
}

function goodTerms(basis: Basis): VerdictTerm[] {
	const { subject, policy, chance, worked } = basis;
	const [cause, ...proved] = chance.terms.map(({ said }) => said);
	const seen = policy.taught?.chance(subject.kind, chance.level, ownTest(subject));
	const tests = shareTaught(seen, 'tested');
	const steps = [taught(`${cause}: ${chance.level}`, tests), ...proved].join('; ');
	const { input, gain } = worked;
	const figures = figuresOf(subject.kind, policy);
	const rows: VerdictTerm[] = [
		{
			said: 'Good when fitted',
			value: chance.chance,
			unit: 'share',
			source: `${steps} (${from(policy, (p) => [p.chances, p.proofOdds])})`
		},
		{
			said: 'Comes back all the same',
			value: input.comeBack,
			unit: 'share',
			source: taught(
				fromKind(basis, 'comeBack'),
				shareTaught(policy.taught?.comeBack(subject.kind), 'gone out')
			)
		},
		{
			said: 'A come-back costs',
			value: input.comeBackCents,
			unit: 'cents',
			source: `${figures.refitMinutes} minutes for the second fitting, ${fromKind(basis, 'refitMinutes')}, at the labour rate`
		},
		{
			said: 'Kit with every sale',
			value: input.kitCents ?? 0,
			unit: 'cents',
			source: fromKind(basis, 'kitCents')
		}
	];
	if (basis.used)
		rows.push({
			said: 'One answered call brings, when it is good',
			value: gain.terms.sale,
			unit: 'cents',
			source: 'asked price less come-backs and kit',
			sum: true
		});
	return rows;
}

function waitTerms(basis: Basis): VerdictTerm[] {
	const { subject, policy, worked } = basis;
	const { input, gain } = worked;
	const family =
		subject.family === 'some'
			? ''
			: `; ${subject.family} of this engine about: times ${FAMILY_FACTOR[subject.family]}`;
	const calls = policy.taught?.calls(subject.kind, subject.engineKey ?? '', subject.family);
	const ages = kind(subject.kind).ages;
	const dying = from(policy, (p) => (ages ? p.dyingRateAgeing : p.dyingRate));
	const rows: VerdictTerm[] = [
		{
			said: 'Calls for it',
			value: input.callsPerYear,
			unit: 'a year',
			source: taught(fromKind(basis, 'callsPerYear') + family, callsTaught(calls))
		},
		{
			said: 'Its place in the queue',
			value: input.place,
			unit: 'count',
			source:
				input.place === 1
					? 'nothing equal or better stands before it'
					: 'equal or better ones on the shelf go first'
		},
		{
			said: 'Money costs',
			value: policy.moneyRate,
			unit: 'share a year',
			source: from(policy, (p) => p.moneyRate)
		},
		{
			said: 'Becomes unsellable',
			value: dyingShare(subject.kind, policy),
			unit: 'share a year',
			source: ages ? `this kind ages; ${dying}` : dying
		}
	];
	if (subject.waiting)
		rows.push({
			said: 'Somebody waits and takes it',
			value: input.waiting ?? 0,
			unit: 'share',
			source: from(policy, (p) => p.waitingChance)
		});
	rows.push({
		said: 'A call that comes in time is worth, of its full worth',
		value: gain.terms.reach,
		unit: 'share',
		source: 'from the calls, the place and the two rates above',
		sum: true
	});
	return rows;
}

function keepTerms(basis: Basis): VerdictTerm[] {
	const { subject, policy, worked } = basis;
	const figures = figuresOf(subject.kind, policy);
	const { scrapClass } = kind(subject.kind);
	const shelf = shelfCents(subject, policy);
	const weighed = subject.massGrams === null ? fromKind(basis, 'massGrams') : 'weighed';
	return [
		{
			said: 'Its room on the shelf',
			value: shelf.cents,
			unit: 'cents a year',
			source:
				shelf.by === 'bin'
					? "its share of the bin's yearly cost"
					: `size ${figures.size}, ${from(policy, (p) => p.shelfCents[figures.size])}`
		},
		{
			said: 'Weighs',
			value: subject.massGrams ?? figures.massGrams,
			unit: 'grams',
			source: weighed
		},
		{
			said: `Scrap: ${findScrapClass(scrapClass)?.said ?? scrapClass}`,
			value: scrapKgCents(scrapClass, policy),
			unit: 'cents a kilogram',
			source: policy.scrapKgCents[scrapClass] === undefined ? 'the usual middle' : OWN
		},
		{
			said: 'Scrap value now',
			value: worked.input.scrapCents,
			unit: 'cents',
			source: 'weight times the yard’s price',
			sum: true
		}
	];
}

function workTerms(basis: Basis): VerdictTerm[] {
	const { subject, policy, season, worked } = basis;
	const { minutesNow, minutesLater } = worked.input;
	const later = isTested(subject)
		? 'nothing left: its bench test is passed'
		: `cleaning and testing, ${fromKind(basis, 'cleanMinutes', 'testMinutes')}`;
	return [
		{
			said: 'Minutes to spend now',
			value: minutesNow,
			unit: 'minutes',
			source: subject.stillOn
				? `pulling, ${fromKind(basis, 'pullMinutes')}; look, photo and tag, ${from(policy, (p) => p.keepMinutes)}`
				: 'it is off: what is spent is spent'
		},
		{ said: 'Minutes that can wait', value: minutesLater, unit: 'minutes', source: later },
		{
			said: `Labour now, ${SEASON_SAID[season]}`,
			value: policy.labourHourCents[season],
			unit: 'cents an hour',
			source: from(policy, (p) => p.labourHourCents[season])
		},
		{
			said: 'Labour later, at the normal rate',
			value: policy.labourHourCents.normal,
			unit: 'cents an hour',
			source: from(policy, (p) => p.labourHourCents.normal)
		}
	];
}

function gainTerms({ subject, used, worked }: Basis): VerdictTerm[] {
	if (!used) return [];
	const { whenCalled, now } = worked.gain.terms;
	const keeps = kind(subject.kind).cleanKeeps;
	const cents = 'cents' as const;
	const rows: VerdictTerm[] = [
		{
			said: 'Kept, work done when somebody calls',
			value: whenCalled,
			unit: cents,
			source: keeps ? '' : 'cleaning does not keep on this kind'
		}
	];
	if (keeps) rows.push({ said: 'Kept, work done today', value: now, unit: cents, source: '' });
	rows.push(
		{ said: 'Scrapped now', value: worked.input.scrapCents, unit: cents, source: '' },
		{
			said: 'Gain over scrapping it now',
			value: worked.gain.gainCents,
			unit: cents,
			source: 'the better of keeping, less the scrap',
			sum: true
		}
	);
	return rows;
}

/** The whole sum in words, each figure with where it comes from. */
export const verdictTerms = (basis: Basis): VerdictTerm[] => [
	...priceTerms(basis),
	...goodTerms(basis),
	...waitTerms(basis),
	...keepTerms(basis),
	...workTerms(basis),
	...gainTerms(basis)
];
