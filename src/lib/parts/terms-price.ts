import { seenSaid } from '$lib/prices/seen';
import { figuresOf } from './kind-figures';
import { shareFor } from './learned';
import { shareTaught } from './learned-said';
import { from, fromKind, taught, type Basis } from './verdict-basis';
import { ownTest } from './verdict-inputs';
import type { VerdictTerm } from './verdict-view';

export function priceTerms({ subject, policy, grade, used }: Basis): VerdictTerm[] {
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

export function goodTerms(basis: Basis): VerdictTerm[] {
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
