import { FAMILY_FACTOR } from '$lib/people/policy';
import { findScrapClass, kind } from '$lib/trade';
import { figuresOf } from './kind-figures';
import { callsTaught } from './learned-said';
import { from, fromKind, OWN, taught, type Basis } from './verdict-basis';
import { dyingShare, scrapKgCents, shelfCents } from './verdict-inputs';
import type { VerdictTerm } from './verdict-view';

export function waitTerms(basis: Basis): VerdictTerm[] {
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
			said: subject.waitingFor
				? `Somebody waits: ${subject.waitingFor}; takes it`
				: 'Somebody waits and takes it',
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

export function keepTerms(basis: Basis): VerdictTerm[] {
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
