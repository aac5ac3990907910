import { kind } from '../trade';
import { usualGrams, whyApart } from './nature';
import type { BinSize } from './size';

// From memory, to be put right by the litres written on a bin: a drawer, a tote, a shelf box, a pallet place.
const HOLDS: Record<BinSize, number> = { s: 12, m: 40, l: 120, xl: 300 };
const TAKES: Record<BinSize, number> = { s: 0.4, m: 1.5, l: 8, xl: 40 };

/** A kind that lies in a bin: how many, and what they weigh where that is known. */
export interface Held {
	kind: string;
	count: number;
	grams: number;
}

export interface Room {
	size: BinSize;
	litres: number | null;
	loadKg: number | null;
	kinds: readonly string[];
	red: boolean;
	contents: readonly Held[];
}

/** The room that a part of this kind takes, in litres. */
export const takes = (kindId: string): number => TAKES[kind(kindId).size];
/** The room that a bin has, in litres: as written on it, else as its size usually has. */
export const holds = (bin: Pick<Room, 'size' | 'litres'>): number => bin.litres ?? HOLDS[bin.size];

/** What parts weigh: those that were weighed and, for the others, the middle of their kind. */
export const weighed = (kindId: string, masses: readonly (number | null)[]): number =>
	masses.reduce<number>((sum, grams) => sum + (grams ?? usualGrams(kind(kindId))), 0);

export const usedLitres = (bin: Pick<Room, 'contents'>): number =>
	bin.contents.reduce((sum, one) => sum + one.count * takes(one.kind), 0);
export const usedGrams = (bin: Pick<Room, 'contents'>): number =>
	bin.contents.reduce((sum, one) => sum + one.grams, 0);
/** How full it is: 0 empty, 1 full; above 1 it bulges. */
export const fullness = (bin: Room): number => usedLitres(bin) / holds(bin);

const isFull = (bin: Room) => fullness(bin) >= 0.95;
const isOverweight = (bin: Room) => bin.loadKg !== null && usedGrams(bin) > bin.loadKg * 1000;

/** The first reason why two kinds in a bin should not lie together. */
function apartIn({ contents }: Room): string | null {
	for (const [at, one] of contents.entries())
		for (const other of contents.slice(at + 1)) {
			const why = whyApart(one.kind, other.kind);
			if (why) return `${kind(one.kind).name} beside ${kind(other.kind).name}: ${why}`;
		}
	return null;
}

/** Parts of several systems, or of kinds that the bin is not named for. */
function isMixed({ kinds, contents }: Room): boolean {
	if (kinds.length > 0) return contents.some((one) => !kinds.includes(one.kind));
	return new Set(contents.map((one) => kind(one.kind).system)).size > 1;
}

export type Flag = 'full' | 'overweight' | 'mixed' | 'apart';
export interface Flagged {
	flag: Flag;
	/** A word or two, for lists. */
	said: string;
	/** What is wrong, with its figures. */
	why: string;
}

const kilos = (grams: number) => `${(grams / 1000).toFixed(1)} kg`;

/** What is to be put right about a bin, the worst first. In the red bin things lie as they come. */
export function flagsOf(bin: Room): Flagged[] {
	const flags: Flagged[] = [];
	if (isOverweight(bin))
		flags.push({
			flag: 'overweight',
			said: 'too heavy',
			why: `About ${kilos(usedGrams(bin))} in it; it may carry ${bin.loadKg} kg.`
		});
	const apart = bin.red ? null : apartIn(bin);
	if (apart) flags.push({ flag: 'apart', said: 'keep apart', why: `${apart}.` });
	if (isFull(bin))
		flags.push({
			flag: 'full',
			said: 'full',
			why: `About ${Math.round(usedLitres(bin))} of ${holds(bin)} litres taken: one in, one out.`
		});
	if (!bin.red && !apart && isMixed(bin))
		flags.push({ flag: 'mixed', said: 'mixed', why: 'One bin, one kind is found faster.' });
	return flags;
}
