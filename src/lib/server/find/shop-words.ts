import { NO_WORDS, WordList, type Lexicon } from '$lib/find/lexicon';
import { and, eq, gt } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { shopWord } from './tables';

interface Kept {
	list: WordList;
	last: number;
}

/** Words are only added, so what was read stays true; a word may be committed after a later one. */
const kept = new Map<number, Kept>();
const MOST_SHOPS = 100;
const OVERLAP = 2000;

/** The words of the shop, with those that came since they were last read. */
export async function wordsOfShop(tx: Tx, ctx: Context): Promise<Lexicon> {
	const before = kept.get(ctx.shopId) ?? { list: new WordList(), last: 0 };
	const rows = await tx
		.select({ id: shopWord.id, word: shopWord.word })
		.from(shopWord)
		.where(and(eq(shopWord.shopId, ctx.shopId), gt(shopWord.id, before.last - OVERLAP)));
	before.list.add(rows.map(({ word }) => word));
	before.last = rows.reduce((last, { id }) => Math.max(last, id), before.last);
	kept.delete(ctx.shopId);
	kept.set(ctx.shopId, before);
	if (kept.size > MOST_SHOPS) kept.delete(kept.keys().next().value!);
	return before.list;
}

/** The words of the shop as they were last read, and which was the last; none before the first time. */
export const wordsRead = (ctx: Context): { list: Lexicon; last: number } =>
	kept.get(ctx.shopId) ?? { list: NO_WORDS, last: 0 };
