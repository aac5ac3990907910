import { kind } from '../trade';
import { HEAVY_GRAMS, LIGHT_GRAMS, usesFor, usualGrams, whyApart } from './nature';
import { holds, takes, usedGrams, usedLitres, type Room } from './room';
import { USE_SAID, type BinUse } from './use';

export interface Shelf extends Room {
	address: string;
	shelf: number | null;
	uses: readonly BinUse[];
}

export interface Suggestion {
	address: string;
	/** Why there, in a few words. */
	why: string;
	/** How many of its kind lie there. */
	parts: number;
}

const ofKind = (bin: Shelf, kindId: string) =>
	bin.contents.reduce((sum, one) => sum + (one.kind === kindId ? one.count : 0), 0);

/** Shelf 1 is the floor: heavy things go no higher than the hip, middling ones not above the shoulder. */
const tooHigh = (shelf: number | null, grams: number) =>
	shelf !== null && ((grams >= HEAVY_GRAMS && shelf > 2) || (grams >= LIGHT_GRAMS && shelf > 3));

const roomFor = (bin: Shelf, kindId: string) =>
	Math.floor((holds(bin) - usedLitres(bin)) / takes(kindId) + 1e-9);

/** Why a part of this kind may not go into a bin; null where it may. */
export function whyNotInto(bin: Shelf, kindId: string, grams: number): string | null {
	if (bin.red) return 'the red bin is for what failed or came back';
	const apart = bin.contents.map((one) => whyApart(kindId, one.kind)).find((why) => why !== null);
	if (apart) return apart;
	if (tooHigh(bin.shelf, grams)) return 'too heavy for that height';
	if (roomFor(bin, kindId) < 1) return 'full';
	if (bin.loadKg !== null && usedGrams(bin) + grams > bin.loadKg * 1000)
		return 'too heavy for what it may carry';
	return null;
}

/** A bin kept for something else is left alone; so is one named for other kinds. */
function isForOthers(bin: Shelf, kindId: string, suits: readonly BinUse[]): boolean {
	if (ofKind(bin, kindId) > 0 || bin.kinds.includes(kindId)) return false;
	if (bin.kinds.length > 0) return true;
	return bin.uses.length > 0 && !bin.uses.some((use) => suits.includes(use));
}

interface Weighed {
	bin: Shelf;
	/** Compared from left to right, the greater first. */
	marks: number[];
	why: string;
	parts: number;
}

function weigh(bin: Shelf, kindId: string, grams: number): Weighed {
	const parts = ofKind(bin, kindId);
	const named = bin.kinds.includes(kindId);
	const use = bin.uses.find((each) => usesFor(kindId, grams).includes(each));
	const empty = bin.contents.length === 0;
	const family =
		!empty && bin.contents.every((one) => kind(one.kind).system === kind(kindId).system);
	const low = grams >= LIGHT_GRAMS ? -(bin.shelf ?? 3) : 0;
	const marks = [
		parts > 0 ? 2 : named ? 1 : 0,
		named ? 1 : 0,
		use ? 1 : 0,
		low,
		family ? 2 : empty ? 1 : 0,
		parts
	];
	return { bin, marks, parts, why: said(bin, { parts, named, use, empty, family }, kindId, grams) };
}

interface Reasons {
	parts: number;
	named: boolean;
	use: BinUse | undefined;
	empty: boolean;
	family: boolean;
}

function said(bin: Shelf, why: Reasons, kindId: string, grams: number): string {
	const room = roomFor(bin, kindId);
	const first =
		why.parts > 0
			? `${why.parts} of its kind`
			: why.named
				? 'named for it'
				: why.use
					? `for ${USE_SAID[why.use]}`
					: why.family
						? `${kind(kindId).system.toLowerCase()} lies there`
						: 'empty';
	const floor = grams >= LIGHT_GRAMS && bin.shelf === 1 ? ', heavy: on the floor' : '';
	return `${first}, room for ${room > 50 ? 'many' : room}${floor}`;
}

const byMarks = (a: Weighed, b: Weighed) => {
	const at = a.marks.findIndex((mark, i) => mark !== b.marks[i]);
	return at < 0
		? a.bin.address.localeCompare(b.bin.address, 'en', { numeric: true })
		: (b.marks[at] ?? 0) - (a.marks[at] ?? 0);
};

const isGuess = ({ bin, marks }: Weighed) =>
	marks[0] === 0 && marks[2] === 0 && bin.contents.length > 0 && marks[4] !== 2;

/**
 * Where to put a part. In: its kind, its grams where it was weighed, the bins in use. Out: the best places
 * first, each with why; none where nothing suits. Its own kind first; never full, overloaded, too
 * high for its weight, or beside what harms it.
 */
export function whereTo(
	part: { kind: string; grams?: number | null },
	bins: readonly Shelf[],
	most = 3
): Suggestion[] {
	const grams = part.grams ?? usualGrams(kind(part.kind));
	const suits = usesFor(part.kind, grams);
	return bins
		.filter((bin) => whyNotInto(bin, part.kind, grams) === null)
		.filter((bin) => !isForOthers(bin, part.kind, suits))
		.map((bin) => weigh(bin, part.kind, grams))
		.filter((one) => !isGuess(one))
		.toSorted(byMarks)
		.slice(0, most)
		.map(({ bin, why, parts }) => ({ address: bin.address, why, parts }));
}
