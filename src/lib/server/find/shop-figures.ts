import type { ShopFigures } from '$lib/parts/learned-view';
import { withDefaults, type Policy } from '$lib/people/policy';
import type { Season } from '$lib/people/settings';
import type { Context } from '../context';
import { readInShop } from '../context';
import type { Db } from '../db';
import { recentFigures } from '../parts';

export interface ShopOf {
	slug: string;
	season: Season;
	timeZone: string;
	policy: ShopFigures;
	/** Its row and policy to the letter, as the database said them. */
	said: string;
}

interface Kept {
	said: string;
	slug: string;
	season: Season;
	timeZone: string;
	policy: Policy;
}

/** What the database says with each answer, so that what is kept here is never taken for what holds. */
export interface ShopSaid {
	said: string;
	/** The last word that the shop has written. */
	words: number;
	/** Whether anybody waits for something. */
	waited: boolean;
}

const kept = new WeakMap<Db, Map<number, Kept>>();
const MOST_SHOPS = 1000;

function keep(ctx: Context, said: string): Kept {
	const shops = kept.get(ctx.db) ?? new Map<number, Kept>();
	kept.set(ctx.db, shops);
	const { figures, ...shop } = JSON.parse(said) as Omit<Kept, 'said' | 'policy'> & {
		figures: Partial<Policy> | null;
	};
	const one = { ...shop, said, policy: withDefaults(figures ?? {}) };
	shops.delete(ctx.shopId);
	shops.set(ctx.shopId, one);
	if (shops.size > MOST_SHOPS) shops.delete(shops.keys().next().value!);
	return one;
}

/** What an answer needs to know of its shop: as it was said last, or, where that is not it any more, as it is said now. */
export async function shopOf(ctx: Context, said?: string): Promise<ShopOf> {
	let shop = kept.get(ctx.db)?.get(ctx.shopId);
	if (said === undefined && !shop) {
		const read = await readInShop<{ shop: ShopSaid }>(ctx, 'find shop', 'find_shop() as shop', []);
		shop = keep(ctx, read.shop.said);
	} else if (said !== undefined && shop?.said !== said) shop = keep(ctx, said);
	return { ...shop!, policy: await recentFigures(ctx, shop!.policy) };
}
