import { makeTag } from '$lib/codes';
import { randomInt } from 'node:crypto';
import type { Context } from '../context';
import type { Tx } from '../db';
import { tag, type TAGGED } from './tables';

type Tagged = (typeof TAGGED)[number];

/** Gives out a code that is new in the shop; the caller's row takes it in the same transaction. */
export async function mintTag(tx: Tx, ctx: Context, what: Tagged): Promise<string> {
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
