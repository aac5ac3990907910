import type { PullInput } from './pull-input';

/** The donor with its parts by number in the list, and what stands before, spoils or excludes what. */
export interface Donor {
	ids: string[];
	/** What must be off before each, directly. */
	needs: number[][];
	/** Each with all that must be off for it. */
	closures: Set<number>[];
	/** What keeping each adds in cents once it is off; 0 or less: it is not kept. */
	net: number[];
	minutes: number[];
	keepMinutes: number[];
	labour: number;
	/** Wholes that a piece belongs to, at any depth. */
	wholes: number[][];
	ruins: number[][];
}

function reached(from: number, steps: readonly number[][]): Set<number> {
	const seen = new Set([from]);
	for (const each of seen) for (const next of steps[each] ?? []) seen.add(next);
	return seen;
}

function wholesOf(from: number, whole: readonly (number | undefined)[]): number[] {
	const found: number[] = [];
	let at = whole[from];
	while (at !== undefined && at !== from && !found.includes(at)) {
		found.push(at);
		at = whole[at];
	}
	return found;
}

/**
 * Reads the list. A piece waits for its whole, except where the piece itself has to come off before
 * the whole can: then it comes first.
 */
export function readDonor({ parts, labourNow }: PullInput): Donor {
	const byId = new Map(parts.map((part, index) => [part.id, index]));
	const present = (ids: readonly string[] | null | undefined, self: number) =>
		[...new Set((ids ?? []).map((id) => byId.get(id)))].filter(
			(index): index is number => index !== undefined && index !== self
		);
	const behind = parts.map((part, index) => present(part.behind, index));
	const whole = parts.map((part, index) => present(part.partOf ? [part.partOf] : [], index)[0]);
	const needs = behind.map((before, index) => {
		const of = whole[index];
		if (of === undefined || before.includes(of) || reached(of, behind).has(index)) return before;
		return [...before, of];
	});
	return {
		ids: parts.map((part) => part.id),
		needs,
		closures: parts.map((_part, index) => reached(index, needs)),
		net: parts.map((part) => part.gainCents - labourNow * (part.keepMinutes ?? 0)),
		minutes: parts.map((part) => part.minutes),
		keepMinutes: parts.map((part) => part.keepMinutes ?? 0),
		labour: labourNow,
		wholes: parts.map((_part, index) => wholesOf(index, whole)),
		ruins: parts.map((part, index) => present(part.ruins, index))
	};
}

/** A set to take off and what of it to keep, by number in the list. */
export interface Haul {
	off: Set<number>;
	kept: Set<number>;
	minutes: number;
	cents: number;
}

/** The least that has to come off to keep these, with its minutes and what it brings. */
export function haulOf(kept: Iterable<number>, donor: Donor): Haul {
	const haul: Haul = { off: new Set(), kept: new Set(kept), minutes: 0, cents: 0 };
	for (const part of haul.kept) for (const each of donor.closures[part]!) haul.off.add(each);
	for (const part of haul.off) {
		haul.minutes += donor.minutes[part]!;
		haul.cents -= donor.labour * donor.minutes[part]!;
	}
	for (const part of haul.kept) {
		haul.minutes += donor.keepMinutes[part]!;
		haul.cents += donor.net[part]!;
	}
	return haul;
}

/** Whether these can be kept together: no piece with its whole, none spoiled on the way. */
export function goTogether({ off, kept }: Haul, donor: Donor): boolean {
	for (const part of kept) if (donor.wholes[part]!.some((whole) => kept.has(whole))) return false;
	for (const part of off) if (donor.ruins[part]!.some((spoiled) => kept.has(spoiled))) return false;
	return true;
}
