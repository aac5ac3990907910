import type { EngineClass, Kind } from '$lib/trade';
import { ALL_YEAR, SNOW, type Calendar, type Season } from './season';

export type Size = Kind['size'];

/** A shop and its market. Every figure is invented. */
export interface Scenario {
	name: string;
	donorsPerYear: number;
	classes: readonly (readonly [EngineClass, number])[];
	families: number;
	/** How many of a family are about: factor on the calls of a kind, and how often it is drawn. */
	marks: readonly (readonly [number, number])[];
	/** Chance that a copy is to be had, and what it costs as a share of new. */
	copies: { chance: number; low: number; high: number };
	calendar: Calendar;
	/** Bench minutes a week for donors. */
	bench: Readonly<Record<Season, number>>;
	/** Dead engines that fit in the yard. */
	yard: number;
	/** Parts that fit on the shelf. */
	places: Readonly<Record<Size, number>>;
}

const base: Scenario = {
	name: 'base',
	donorsPerYear: 60,
	classes: [
		['WB', 4],
		['R1', 3],
		['R2', 2],
		['GP', 2],
		['SN', 1],
		['GE', 1],
		['SA', 1],
		['PW', 1]
	],
	families: 12,
	marks: [
		[1, 6],
		[3, 2],
		[0.3, 3]
	],
	copies: { chance: 0.5, low: 0.3, high: 0.6 },
	calendar: ALL_YEAR,
	bench: { slow: 480, normal: 240, rush: 60 },
	yard: 24,
	places: { s: 1500, m: 1000, l: 400, xl: 60 }
};

export const SCENARIOS: readonly Scenario[] = [
	{
		...base,
		name: 'slow shop',
		donorsPerYear: 24,
		families: 8,
		marks: [
			[1, 1],
			[0.3, 2]
		],
		bench: { slow: 240, normal: 120, rush: 30 },
		yard: 12
	},
	{
		...base,
		name: 'busy shop',
		donorsPerYear: 100,
		families: 14,
		marks: [
			[1, 1],
			[3, 2]
		],
		bench: { slow: 1200, normal: 600, rush: 120 },
		yard: 48
	},
	{ ...base, name: 'cheap copies', copies: { chance: 0.9, low: 0.12, high: 0.35 } },
	{
		...base,
		name: 'snow season',
		calendar: SNOW,
		classes: [
			['SN', 7],
			['GE', 2],
			['R1', 1]
		]
	},
	{ ...base, name: 'little space', places: { s: 120, m: 60, l: 20, xl: 4 } }
];
