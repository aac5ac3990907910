import { makeTag, readTag } from '$lib/codes';
import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { randomInt } from 'node:crypto';
import type { Context } from '../context';
import type { Tx } from '../db';
import { tag, type TAGGED } from './tables';

type Tagged = (typeof TAGGED)[number];

async function mint(tx: Tx, ctx: Context, what: Tagged | 'blank'): Promise<string> {
	for (;;) {
		const code = makeTag(() => randomInt(2 ** 32));
		const [row] = await tx
			.insert(tag)
			.values({ shopId: ctx.shopId, code, what, mintedAt: ctx.now })
			.onConflictDoNothing()
			.returning({ code: tag.code });
		if (row) return row.code;
	}
}

/** A blank tag gets its thing; of two that claim it, one does. */
async function claim(tx: Tx, ctx: Context, what: Tagged, typed: string): Promise<string> {
	const reading = readTag(typed);
	const code = 'tag' in reading ? reading.tag : '';
	const own = and(eq(tag.shopId, ctx.shopId), eq(tag.code, code));
	const [row] = await tx
		.update(tag)
		.set({ what })
		.where(and(own, eq(tag.what, 'blank')))
		.returning({ code: tag.code });
	if (row) return row.code;
	const [given] = await tx.select({ what: tag.what }).from(tag).where(own);
	if (!given)
		throw new Refused('bad input', `No blank tag of this shop carries ${typed.trim()}.`, 'tag');
	throw new Refused(
		'taken',
		`${code} is on a ${given.what} already. Take another blank tag.`,
		'tag'
	);
}

/**
 * Gives out a code that is new in the shop; the caller's row takes it in the same transaction. Where a blank
 * tag hangs on the thing already, `blank` is its code and is given to it.
 */
export const mintTag = (tx: Tx, ctx: Context, what: Tagged, blank?: string): Promise<string> =>
	blank === undefined ? mint(tx, ctx, what) : claim(tx, ctx, what, blank);

export const mintBlank = (tx: Tx, ctx: Context): Promise<string> => mint(tx, ctx, 'blank');
