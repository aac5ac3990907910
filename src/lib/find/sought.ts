import type { Need } from './need';
import type { Plan } from './plan';

/** A plan as the index is asked: queries over the lexemes of one shop. */
export interface Sought {
	strict: string | null;
	/** The same where the address that was typed is no bin of the shop: then it is a word. */
	strictWord: string | null;
	loose: string | null;
	looseWord: string | null;
	/** Where no kind was named: any of the words. */
	wide: string | null;
	/** Each word by itself, for the order of a widened answer. */
	each: string[];
	weak: string | null;
}

type Way = 'exact' | 'near';

const MOST_WAYS = 130;

/** A lexeme in the words of a query; what could end the quotes is left out. */
function quoted(shopId: number, lexeme: string): string {
	const open = lexeme.endsWith('*');
	const bare = lexeme.replace(/[*'\\\0]/g, '').slice(0, 60);
	return `'${shopId}:${bare}'${open ? ':*' : ''}`;
}

const anyOf = (shopId: number, lexemes: readonly string[]) =>
	`(${[...new Set(lexemes)]
		.slice(0, MOST_WAYS)
		.map((one) => quoted(shopId, one))
		.join('|')})`;

const allOf = (shopId: number, needs: readonly Need[], way: Way) =>
	needs.map((need) => anyOf(shopId, need[way])).join('&');

/** What was named with the rest of the words, or every word to the letter. */
function either(
	shopId: number,
	plan: Plan,
	needs: readonly Need[],
	literally: readonly Need[],
	way: Way
) {
	const kinds = plan.kinds.map((kind) => `#${kind}`);
	const named =
		kinds.length > 0
			? [anyOf(shopId, kinds), ...needs.map((need) => anyOf(shopId, need[way]))]
			: [];
	const ways = [named.join('&'), allOf(shopId, literally, way)].filter(Boolean);
	return ways.length === 0 ? null : ways.map((one) => `(${one})`).join('|');
}

/** Queries for a plan. A question of kinds alone is answered by the list of its kinds, not by words. */
export function soughtBy(shopId: number, plan: Plan): Sought {
	const { needs, literally, bin } = plan;
	const place = bin ? [placeNeed(bin)] : [];
	const withPlace = [...needs, ...place];
	const literalFirst = plan.guessed && literally.length > 1;
	const kindsAlone = plan.kinds.length > 0 && needs.length === 0;
	const ask = (some: readonly Need[], all: readonly Need[], way: Way) =>
		either(shopId, plan, some, all, way);
	return {
		strict: literalFirst
			? allOf(shopId, literally, 'exact')
			: kindsAlone || needs.length === 0
				? null
				: ask(needs, literally, 'exact'),
		strictWord: withPlace.length === 0 ? null : ask(withPlace, [...literally, ...place], 'exact'),
		loose:
			literally.length === 0 ? null : ask(needs.length > 0 ? needs : literally, literally, 'near'),
		looseWord: withPlace.length === 0 ? null : ask(withPlace, [...literally, ...place], 'near'),
		wide:
			plan.kinds.length > 0 || needs.length === 0
				? null
				: anyOf(
						shopId,
						needs.flatMap((need) => need.near)
					),
		each: withPlace.map((need) => anyOf(shopId, need.near)),
		weak: plan.weak.length > 0 ? anyOf(shopId, plan.weak) : null
	};
}

const placeNeed = (bin: string): Need => {
	const code = bin.replace('-', '').replaceAll('O', '0').replaceAll('I', '1');
	return { said: bin, exact: [code], near: [code, `${code}*`] };
};
