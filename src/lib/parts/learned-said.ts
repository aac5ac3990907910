import { percent, plural } from '$lib/format';
import type { CallsFigure, Figure } from './learned-view';

export const rateSaid = (rate: number): string =>
	new Intl.NumberFormat('en-US', { maximumSignificantDigits: rate < 1 ? 1 : 2 }).format(rate);

const inTime = (years: number): string => {
	if (years < 1 / 6) return plural(Math.max(1, Math.round(years * 365)), 'day', 'days');
	return years < 2 ? `${Math.round(years * 12)} months` : `${rateSaid(years)} years`;
};

export const shareBetween = ({ low, high }: Figure): string =>
	`between ${Math.round(low * 100)} and ${percent(high)}`;

export const rateBetween = ({ low, high }: Figure): string =>
	`between ${rateSaid(low)} and ${rateSaid(high)}`;

/** How many stand behind a share, such as "14 tested here"; '' for none. */
export const shareSeen = ({ observations }: Figure, done: string): string =>
	observations === 0 ? '' : `${observations} ${done} here`;

/** How many calls in how long stand behind a rate; '' where nothing was watched. */
export function callsSeen({ own, others }: CallsFigure): string {
	const here =
		own.calls + own.years > 0
			? `${own.calls} taken for this engine in ${inTime(own.years)} with one ready`
			: '';
	const elsewhere = here ? 'for other engines' : 'of its kind taken';
	const there =
		others.calls + others.years > 0
			? `${others.calls} ${elsewhere} in ${inTime(others.years)}, all engines added up`
			: '';
	return [here, there].filter(Boolean).join('; ');
}

/** What stands behind a share of a verdict's sum, with its interval; '' for nothing. */
export function shareTaught(figure: Figure | undefined, done: string): string {
	const seen = figure ? shareSeen(figure, done) : '';
	return figure && seen ? `${seen}, ${shareBetween(figure)}` : '';
}

/** The same for calls a year. */
export function callsTaught(figure: CallsFigure | undefined): string {
	const seen = figure ? callsSeen(figure) : '';
	return figure && seen ? `${seen}; ${rateBetween(figure)}` : '';
}
