import { KINDS } from './kinds.data';

export const ENGINE_CLASSES = [
	{ id: 'WB', said: 'walk-behind' },
	{ id: 'GP', said: 'general-purpose, horizontal shaft' },
	{ id: 'R1', said: 'rider, one cylinder' },
	{ id: 'R2', said: 'rider, two cylinders' },
	{ id: 'SN', said: 'snow thrower' },
	{ id: 'GE', said: 'generator' },
	{ id: 'SA', said: 'saw' },
	{ id: 'TR', said: 'trimmer' },
	{ id: 'PW', said: 'pressure washer' }
] as const;
export type EngineClass = (typeof ENGINE_CLASSES)[number]['id'];

export const FITTINGS = [
	'recoil',
	'12 V start',
	'mains start',
	'charging',
	'two cylinders'
] as const;
export type Fitting = (typeof FITTINGS)[number];

export type Reuse = 'look-over' | 'test' | 'safety-own' | 'safety-trade' | 'never';

/** What a part is. Money in cents, minutes marginal, masses in grams, shares 0 to 1. */
export interface Kind {
	id: string;
	system: string;
	name: string;
	alsoCalled: readonly string[];
	on: readonly EngineClass[];
	partOf: string | null;
	newLowCents: number;
	newHighCents: number;
	pullMinutes: number;
	behind: readonly string[];
	/** What taking it off spoils. */
	ruins?: readonly string[];
	cleanMinutes: number;
	testMinutes: number;
	cleanKeeps: boolean;
	kitCents: number;
	refitMinutes: number;
	comeBack: number;
	howTested: string;
	massLowGrams: number;
	massHighGrams: number;
	size: 's' | 'm' | 'l' | 'xl';
	scrapClass: string;
	keeping: string;
	ages: boolean;
	reuse: Reuse;
	reason: string;
	callsPerYear: number;
}

const byId = new Map(KINDS.map((each) => [each.id, each]));

/** All kinds, in the order of the trade's systems. */
export const kinds: readonly Kind[] = KINDS;

/** The kind with this id, or null. */
export function findKind(id: string): Kind | null {
	return byId.get(id) ?? null;
}

/** The kind with this id. Throws RangeError when there is none. */
export function kind(id: string): Kind {
	const found = byId.get(id);
	if (!found) throw new RangeError(`no such kind: ${id}`);
	return found;
}

/** Whether this is the id of a kind. */
export function isKindId(id: string): boolean {
	return byId.has(id);
}
