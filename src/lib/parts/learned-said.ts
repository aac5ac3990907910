import { plural } from '$lib/format';
import { isSeen, type CallsCount } from './calls-rule';
import type { CallsFigure, Figure } from './learned-view';

// made once: a list has thousands of terms
const [one, two] = [1, 2].map(
	(maximumSignificantDigits) => new Intl.NumberFormat('en-US', { maximumSignificantDigits })
) as [Intl.NumberFormat, Intl.NumberFormat];

export const rateSaid = (rate: number): string => (rate < 1 ? one : two).format(rate);

const inTime = (years: number): string => {
	if (years < 1 / 6) return plural(Math.max(1, Math.round(years * 365)), 'day', 'days');
	return years < 2 ? `${Math.round(years * 12)} months` : `${rateSaid(years)} years`;
};

export const shareBetween = ({ low, high }: Figure): string =>
	`between ${Math.round(low * 100)} and ${Math.round(high * 100)}%`;

export const rateBetween = ({ low, high }: Figure): string =>
	`between ${rateSaid(low)} and ${rateSaid(high)}`;

/** How many stand behind a share, such as "14 tested here"; '' for none. */
export const shareSeen = ({ observations }: Figure, done: string): string =>
	observations === 0 ? '' : `${observations} ${done} here`;

/** Searches in vain count for part of a call. */
const tenths = (calls: number) => Math.round(calls * 10) / 10;

const callsIn = ({ calls, years }: CallsCount, whose: string) =>
	`${tenths(calls)} ${whose} in ${inTime(years)}`;

/** How many calls for a kind in how long, the time of all its engines added up. */
export const callsSeen = ({ others }: CallsFigure): string =>
	isSeen(others) ? callsIn(others, 'taken') : '';

/** What stands behind a share of a verdict's sum, with its interval; '' for nothing. */
export function shareTaught(figure: Figure | undefined, done: string): string {
	const seen = figure ? shareSeen(figure, done) : '';
	return figure && seen ? `${seen}, ${shareBetween(figure)}` : '';
}

const callsAgainst = ({ calls, years }: CallsCount, whose: string) =>
	`${tenths(calls)} ${whose} where ${rateSaid(years)} would be usual`;

/** The same for calls a year: on this engine, on all others, and what tells of those by the way. */
export function callsTaught(figure: CallsFigure | undefined): string {
	if (!figure) return '';
	const { own, others, engine, shop } = figure;
	const seen = [
		...(isSeen(own) ? [callsIn(own, 'taken for this engine')] : []),
		...(isSeen(others) ? [callsIn(others, 'for other engines together')] : []),
		...(isSeen(engine) ? [callsAgainst(engine, 'for other parts of this engine')] : []),
		...(isSeen(shop) ? [callsAgainst(shop, 'for all other kinds')] : [])
	];
	return seen.length === 0 ? '' : `${seen.join(', ')}, ${rateBetween(figure)}`;
}
