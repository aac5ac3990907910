import { numberKey } from '../codes/number';
import type { Spot } from '../photos/seen';
import type { FieldRead } from './label-look';

/** What several looks at a picture make of one field. */
export interface Agreed {
	text: string;
	/** How sure its least sure character is, 0 to 1. */
	sure: number;
	/** How many looks read it so. */
	looks: number;
	spot: Spot;
	by: FieldRead['by'];
}

const WEIGHT: Record<FieldRead['by'], number> = { heading: 1, shape: 0.9, known: 1, guess: 0.3 };
/** Below these a character is doubtful: so sure by itself, or such a share of what the looks say. */
const READ = 0.4;
const SHARE = 0.6;

const total = (some: readonly number[]) => some.reduce((sum, one) => sum + one, 0);
const weight = ({ sure, by }: FieldRead) => (total(sure) / Math.max(sure.length, 1)) * WEIGHT[by];

/** A reading without its spaces, which come and go with the looks. */
interface Bare {
	read: FieldRead;
	characters: string[];
	sure: number[];
	/** In front of which of the characters a space stood. */
	spaces: Set<number>;
}

function bare(read: FieldRead): Bare {
	const spaces = new Set<number>();
	const characters: string[] = [];
	const sure: number[] = [];
	[...read.text].forEach((character, at) => {
		if (character === ' ') spaces.add(characters.length);
		else {
			characters.push(character);
			sure.push(read.sure[at] ?? 0);
		}
	});
	return { read, characters, sure, spaces };
}

/** One place of the text: what most looks have there, and how sure that is. */
function vote(reads: Bare[], at: number): [character: string, sure: number] {
	const votes = new Map<string, number[]>();
	for (const { characters, sure } of reads) {
		const character = characters[at] ?? '';
		votes.set(character, [...(votes.get(character) ?? []), sure[at] ?? 0]);
	}
	const ranked = [...votes].sort((a, b) => total(b[1]) - total(a[1]));
	const [character, sures] = ranked[0]!;
	const all = total(ranked.map(([, some]) => total(some)));
	// O for 0 and I for 1 is no doubt: both are found by either
	const same = ranked.every(([other]) => numberKey(other) === numberKey(character));
	const share = same || all === 0 ? 1 : total(sures) / all;
	const sure = Math.max(...sures) * share;
	return [sure < READ || share < SHARE ? '?' : character, sure];
}

function settle(group: Bare[]): Agreed {
	const best = group.toSorted((a, b) => weight(b.read) - weight(a.read))[0]!;
	const { text, spot, by } = best.read;
	const places = best.characters.map((_, at) => vote(group, at));
	const spaced = (at: number) =>
		group.filter(({ spaces }) => spaces.has(at)).length * 2 > group.length;
	const voted = places
		.map(([character], at) => (spaced(at) ? ` ${character}` : character))
		.join('');
	return {
		text: by === 'known' ? text : voted,
		sure: Math.min(...places.map(([, sure]) => sure)),
		looks: group.length,
		spot,
		by
	};
}

/** Readings of one length that differ in a third of their places at most are the same thing misread. */
function alike({ characters: one }: Bare, { characters: other }: Bare): boolean {
	if (one.length !== other.length) return false;
	const differ = one.filter(
		(character, at) => numberKey(character) !== numberKey(other[at] ?? '')
	).length;
	return differ <= Math.max(1, one.length / 3);
}

/**
 * What the looks have in common, the likeliest first. In: for each look what it read for one field. Out:
 * the readings that differ by more than a character here or there; where looks of one length do not
 * agree about a character, or none is sure of it, it is `?`.
 */
export function agreed(looks: readonly (readonly FieldRead[])[]): Agreed[] {
	const groups: Bare[][] = [];
	for (const reads of looks) {
		const taken = new Set<Bare[]>();
		for (const one of reads.map(bare)) {
			const group = groups.find((some) => alike(some[0]!, one));
			// a look has one vote
			if (group && taken.has(group)) continue;
			if (group) group.push(one);
			else groups.push([one]);
			taken.add(group ?? groups.at(-1)!);
		}
	}
	const weighed = (group: Bare[]) => total(group.map(({ read }) => weight(read)));
	return groups.sort((a, b) => weighed(b) - weighed(a)).map(settle);
}
