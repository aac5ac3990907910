import { BIN_UNDO_DAYS, binHappened, mayUndoBin } from '$lib/bins/history';
import type { BinHappening } from '$lib/bins/view';
import { and, desc, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { event, member } from '../people/tables';

const DAY_MS = 24 * 3600 * 1000;

/** What happened to a bin, the newest first; only the newest can be taken back. */
export async function historyOf(tx: Tx, ctx: Context, binId: number): Promise<BinHappening[]> {
	const rows = await tx
		.select({ id: event.id, at: event.at, what: event.what, detail: event.detail, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'bin'), eq(event.aboutId, binId)))
		.orderBy(desc(event.id))
		.limit(20);
	return rows.map(({ what, detail, ...row }, at) => ({
		...row,
		said: binHappened({ what, detail }),
		undo:
			at === 0 && mayUndoBin(what) && ctx.now.getTime() - row.at.getTime() <= BIN_UNDO_DAYS * DAY_MS
	}));
}
