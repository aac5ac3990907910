import { kind } from '$lib/trade';
import { from, fromKind, SEASON_SAID, type Basis } from './verdict-basis';
import { isTested } from './verdict-inputs';
import type { VerdictTerm } from './verdict-view';

export function workTerms(basis: Basis): VerdictTerm[] {
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

export function gainTerms({ subject, used, worked }: Basis): VerdictTerm[] {
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
