export const UNITS = ['inch', 'mm'] as const;
export type Units = (typeof UNITS)[number];

/** What a bench minute costs today follows the season. */
export const SEASONS = ['normal', 'slow', 'rush'] as const;
export type Season = (typeof SEASONS)[number];

/** What every page of a shop needs to know about it. */
export interface ShopSettings {
	slug: string;
	name: string;
	currency: string;
	timeZone: string;
	units: Units;
	season: Season;
	version: number;
}
