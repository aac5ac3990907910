import { DEFAULT_POLICY } from '$lib/people/policy';

export const WEEKS = 52;
export type Season = 'slow' | 'normal' | 'rush';

/** What each week of a year is like: its season, and how calls are spread over the year. */
export interface Calendar {
	seasons: readonly Season[];
	/** Mean 1 over the year. */
	calls: readonly number[];
}

type Stretch = readonly [from: number, to: number];

function calendar(
	rush: readonly Stretch[],
	slow: readonly Stretch[],
	weights: Readonly<Record<Season, number>>
): Calendar {
	const within = (stretches: readonly Stretch[], week: number) =>
		stretches.some(([from, to]) => week >= from && week <= to);
	const seasons = Array.from({ length: WEEKS }, (_, week): Season => {
		if (within(rush, week)) return 'rush';
		return within(slow, week) ? 'slow' : 'normal';
	});
	const mean = seasons.reduce((sum, season) => sum + weights[season], 0) / WEEKS;
	return { seasons, calls: seasons.map((season) => weights[season] / mean) };
}

const deepWinter: Stretch = [0, 8];

export const ALL_YEAR = calendar(
	[[12, 20]],
	[deepWinter, [28, 33], [48, 51]],
	// busiest in spring, little in the lulls
	{ rush: 1.6, normal: 1, slow: 0.6 }
);

export const SNOW = calendar(
	[
		[0, 3],
		[43, 51]
	],
	[[14, 34]],
	// a few weeks bring most of the year's calls
	{ rush: 3.2, normal: 0.4, slow: 0.1 }
);

export function seasonAt(week: number, { seasons }: Calendar): Season {
	return seasons[week % WEEKS] ?? 'normal';
}

/** Time since the start in years, each week counted by how many of the year's calls it brings. */
export function watched(years: number, { calls }: Calendar): number {
	const whole = Math.floor(years);
	const weeks = (years - whole) * WEEKS;
	const part = calls.reduce(
		(sum, weight, week) => sum + weight * Math.min(1, Math.max(0, weeks - week)),
		0
	);
	return whole + part / WEEKS;
}

/** Labour, cents a minute. */
export const minuteRate = (season: Season): number => DEFAULT_POLICY.labourHourCents[season] / 60;
export const NORMAL_RATE = minuteRate('normal');
