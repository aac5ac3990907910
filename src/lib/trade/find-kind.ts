import { ALIASES, BY_SOUND, VOCABULARY, type Alias } from './aliases';
import type { Kind } from './kind';
import { editsBetween, lettersOf, mayBeNear, soundOf, wordsOf } from './spelling';

export type MatchedHow = 'name' | 'called' | 'sounds' | 'near';

export interface KindMatch {
	kind: Kind;
	how: MatchedHow;
}

interface Hit {
	alias: Alias;
	how: MatchedHow;
	places: ReadonlySet<number>;
}

interface Reached {
	place: number;
	how: 'exact' | 'sounds' | 'near';
}

const RANK: Record<MatchedHow, number> = { name: 0, called: 0, sounds: 1, near: 2 };

const LETTERS = [...VOCABULARY]
	.filter((known) => known.length >= 3)
	.map((known) => [known, lettersOf(known)] as const);

const byFirst = new Map<string, Alias[]>();
for (const alias of ALIASES) {
	const [first = ''] = alias.words;
	byFirst.set(first, [...(byFirst.get(first) ?? []), alias]);
}
const rank = new Map(ALIASES.map((alias, at) => [alias, at]));

/** The names that may be meant: those whose first word was reached, in the order of the trade. */
const namesWith = (reached: ReadonlyMap<string, Reached>): Alias[] =>
	[...reached.keys()]
		.flatMap((word) => byFirst.get(word) ?? [])
		.sort((a, b) => rank.get(a)! - rank.get(b)!);

function nearWords(word: string): string[] {
	const most = word.length >= 7 ? 2 : word.length >= 4 ? 1 : 0;
	if (most === 0) return [];
	let least = most;
	let nearest: string[] = [];
	const letters = lettersOf(word);
	for (const [known, theirs] of LETTERS) {
		if (!mayBeNear(letters, theirs, least)) continue;
		const edits = editsBetween(word, known, least);
		if (edits > least) continue;
		nearest = edits < least ? [known] : [...nearest, known];
		least = edits;
	}
	return nearest;
}

// which known words the typed ones reach, and from where
function reachedBy(words: readonly string[]): Map<string, Reached> {
	const reached = new Map<string, Reached>();
	words.forEach((word, place) => {
		if (VOCABULARY.has(word)) reached.set(word, { place, how: 'exact' });
	});
	words.forEach((word, place) => {
		if (VOCABULARY.has(word) || /\d/.test(word)) return;
		const heard = BY_SOUND.get(soundOf(word)) ?? [];
		// where one sounds the same, another first letter is no slip of this word
		const near = nearWords(word).filter((known) => heard.length === 0 || known[0] === word[0]);
		const found = [
			...heard.map((known) => ({ known, how: 'sounds' as const })),
			...near.map((known) => ({ known, how: 'near' as const }))
		];
		for (const { known, how } of found) {
			if (!reached.has(known)) reached.set(known, { place, how });
		}
	});
	return reached;
}

function hitOf(alias: Alias, reached: ReadonlyMap<string, Reached>): Hit | null {
	const places = new Set<number>();
	let how: MatchedHow = alias.how;
	for (const word of alias.words) {
		const found = reached.get(word);
		if (!found) return null;
		places.add(found.place);
		if (found.how !== 'exact' && RANK[found.how] > RANK[how]) how = found.how;
	}
	return places.size === alias.words.length ? { alias, how, places } : null;
}

// the longest alias claims its words; a shorter one shares them only when it is a kind's own name
function unclaimed(hits: readonly Hit[]): Hit[] {
	return hits.filter(
		(hit) =>
			hit.alias.how === 'name' ||
			![...hit.places].every((place) =>
				hits.some((other) => other.places.size > hit.places.size && other.places.has(place))
			)
	);
}

// a guess stands beside what was spelt right only when it explains more of the words
function withoutIdleGuesses(hits: readonly Hit[]): Hit[] {
	const isGuess = (hit: Hit) => RANK[hit.how] > 0;
	const longest = Math.max(0, ...hits.filter((hit) => !isGuess(hit)).map((hit) => hit.places.size));
	return hits.filter((hit) => !isGuess(hit) || hit.places.size > longest);
}

function inName(each: Kind, words: readonly string[]): number {
	const named = new Set(wordsOf(each.name));
	return words.filter((word) => named.has(word)).length;
}

// words explained, then how surely, then how much of the text the kind's own name holds
function byFit(words: readonly string[]): (a: Hit, b: Hit) => number {
	return (a, b) =>
		b.places.size - a.places.size ||
		RANK[a.how] - RANK[b.how] ||
		inName(b.alias.kind, words) - inName(a.alias.kind, words) ||
		b.alias.kind.callsPerYear - a.alias.kind.callsPerYear;
}

/**
 * The kinds that a text may mean, best first: by name, by what it is also called (listed
 * misspellings included, words in any order, the longest name first), by sound, then by nearness:
 * one edit from four letters, two from seven. Words that name no kind are passed over. Empty when
 * nothing comes near. A name that two kinds share gives both.
 */
export function matchKinds(text: string): KindMatch[] {
	const words = wordsOf(text);
	const reached = reachedBy(words);
	const hits = namesWith(reached)
		.map((alias) => hitOf(alias, reached))
		.filter((hit) => hit !== null);
	const matches = new Map<string, KindMatch>();
	for (const { alias, how } of unclaimed(withoutIdleGuesses(hits)).sort(byFit(words))) {
		if (!matches.has(alias.kind.id)) matches.set(alias.kind.id, { kind: alias.kind, how });
	}
	return [...matches.values()];
}
