import type { CauseId, EngineClass } from '$lib/trade';

/** What a shop may expect of a whole engine until it says otherwise. From memory; no source. */
export interface EngineFigures {
	/** Sold running, second-hand. */
	runningCents: number;
	/** Sold dead, as it stands. */
	deadCents: number;
	yardYearCents: number;
	grams: number;
	runningCallsPerYear: number;
	deadCallsPerYear: number;
}

const figures = (
	runningCents: number,
	deadCents: number,
	yardYearCents: number,
	grams: number
): EngineFigures => ({
	...{ runningCents, deadCents, yardYearCents, grams },
	...{ runningCallsPerYear: 2, deadCallsPerYear: 1 }
});

export const ENGINE_FIGURES: Readonly<Record<EngineClass, EngineFigures>> = {
	WB: figures(9000, 1500, 4000, 10_000),
	GP: figures(14_000, 2500, 4000, 16_000),
	R1: figures(35_000, 6000, 7500, 27_000),
	R2: figures(65_000, 9000, 7500, 38_000),
	SN: figures(18_000, 3000, 4000, 18_000),
	GE: figures(20_000, 3500, 4000, 20_000),
	SA: figures(9000, 2000, 4000, 4000),
	TR: figures(6000, 1200, 4000, 3000),
	PW: figures(14_000, 2500, 4000, 16_000)
};

/** What repairing an engine takes, by what killed it. From memory; no source. */
export interface RepairFigures {
	/** Chance that the repair holds. */
	chance: number;
	/** New parts, as a share of what such an engine usually brings running. */
	partsShare: number;
	minutes: number;
}

const repair = (chance: number, partsShare: number, minutes: number): RepairFigures => ({
	...{ chance, partsShare, minutes }
});

export const REPAIRS: Readonly<Record<CauseId, RepairFigures>> = {
	'no-oil': repair(0.6, 0.55, 240),
	'thrown-rod': repair(0.6, 0.65, 270),
	dirt: repair(0.65, 0.35, 210),
	overheated: repair(0.75, 0.12, 120),
	strike: repair(0.6, 0.3, 180),
	water: repair(0.5, 0.25, 180),
	'stale-fuel': repair(0.85, 0.08, 60),
	valve: repair(0.75, 0.15, 150),
	'broken-block': repair(0.5, 0.65, 270),
	fire: repair(0.3, 0.5, 240),
	flood: repair(0.45, 0.2, 150),
	overspeed: repair(0.4, 0.55, 240),
	lean: repair(0.6, 0.35, 120),
	retired: repair(0.95, 0.03, 30),
	electrical: repair(0.85, 0.15, 60),
	worn: repair(0.65, 0.35, 240),
	unknown: repair(0.5, 0.3, 150)
};

/** Years until a parked donor is looked at again. */
export const REVIEW_YEARS = 2;
/** Minutes to show a dead engine and see it off. */
export const HANDLING_MINUTES = 20;
/** What an engine is to the yard while its steel is still in. */
export const ENGINE_SCRAP = 'Al-Fe';
