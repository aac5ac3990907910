import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { createHash } from 'node:crypto';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { answered } from './tables';

/** A fingerprint of what was asked for, so that a key cannot be used for something else. */
export const fingerprint = (where: string, input: unknown): string =>
	createHash('sha256')
		.update(where)
		.update('\n')
		.update(JSON.stringify(input) ?? '')
		.digest('base64url');

const mine = (ctx: Context, key: string) =>
	and(eq(answered.shopId, ctx.shopId), eq(answered.memberId, ctx.memberId), eq(answered.key, key));

async function before(tx: Tx, ctx: Context, key: string, bodyHash: string) {
	const [row] = await tx.select().from(answered).where(mine(ctx, key));
	if (row && row.bodyHash !== bodyHash)
		throw new Refused('key reused', 'This key was used for another change. Send a new one.');
	return row;
}

/** Whether a change was answered already: what is dear, like a photo, need not be made again. */
export const wasAnswered = (ctx: Context, key: string, bodyHash: string): Promise<boolean> =>
	inShop(ctx, async (tx, ctx) => (await before(tx, ctx, key, bodyHash)) !== undefined);

/**
 * Does a change once per key, in the same transaction as the change itself: the same key and body again
 * gets the first answer, another body under the same key is refused. `kept` says what a repeat is told, where
 * the answer itself must not be kept.
 */
export const once = <T>(
	ctx: Context,
	key: string,
	bodyHash: string,
	work: (ctx: Context) => Promise<T>,
	kept: (answer: T) => unknown = (answer) => answer
): Promise<T> =>
	inShop(ctx, async (tx, ctx) => {
		const [first] = await tx
			.insert(answered)
			.values({ shopId: ctx.shopId, memberId: ctx.memberId, key, bodyHash, at: ctx.now })
			.onConflictDoNothing()
			.returning({ key: answered.key });
		if (!first) return (await before(tx, ctx, key, bodyHash))?.answer as T;
		const answer = await work(ctx);
		await tx
			.update(answered)
			.set({ answer: kept(answer) ?? null })
			.where(mine(ctx, key));
		return answer;
	});
