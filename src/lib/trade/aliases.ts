import { kinds, type Kind } from './kind';
import { soundOf, wordsOf } from './spelling';

export interface Alias {
	kind: Kind;
	words: readonly string[];
	how: 'name' | 'called';
}

// names that open with a word for something else
const NEVER_SHORT: readonly string[] = ['brake', 'pulley', 'keyswitch', 'cable', 'vcover'];

function aliasesOf(each: Kind): Alias[] {
	const short = NEVER_SHORT.includes(each.id) ? each.name : each.name.split(/[,/(]/)[0];
	const names = [each.name, short ?? each.name].map((text) => ({ text, how: 'name' as const }));
	const called = each.alsoCalled.map((text) => ({ text, how: 'called' as const }));
	return [...names, ...called].map(({ text, how }) => ({
		kind: each,
		words: [...new Set(wordsOf(text))],
		how
	}));
}

/** Every name that people use for a kind, as words. */
export const ALIASES: readonly Alias[] = kinds.flatMap(aliasesOf);

/** Every word that stands in a name or an alias, and the same by sound. */
export const VOCABULARY: ReadonlySet<string> = new Set(ALIASES.flatMap((alias) => alias.words));

export const BY_SOUND: ReadonlyMap<string, readonly string[]> = (() => {
	const heard = new Map<string, string[]>();
	for (const word of VOCABULARY) {
		const sound = soundOf(word);
		if (sound.length < 3) continue;
		heard.set(sound, [...(heard.get(sound) ?? []), word]);
	}
	return heard;
})();

const wordsByKind = new Map(
	kinds.map((each) => [
		each.id,
		new Set(ALIASES.filter((alias) => alias.kind.id === each.id).flatMap((alias) => alias.words))
	])
);

/** The words under which a kind is looked for, lower case, for an index. */
export function kindWords(kindId: string): string[] {
	return [...(wordsByKind.get(kindId) ?? [])];
}
