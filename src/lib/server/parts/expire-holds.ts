import { and, desc, eq, inArray, lte } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Db } from '../db';
import { event } from '../people/tables';
import { freeIfExpired } from './hold';
import { partRow } from './row';
import { part } from './tables';

/** Lets go of every hold of a shop whose date is past. Returns how many there were. */
export async function expireHolds(db: Db, shopId: number, now: Date): Promise<number> {
	let freed = 0;
	for (const { tag, memberId } of await expired(db, shopId, now)) {
		const ctx: Context = { db, shopId, memberId, role: 'bench', now };
		const done = await inShop(ctx, async (tx, ctx) =>
			freeIfExpired(tx, ctx, await partRow(tx, ctx, tag, 'lock'))
		);
		if (done) freed += 1;
	}
	return freed;
}

/** The holds that ran out, each with the member who gave it: the end is written under that name. */
function expired(db: Db, shopId: number, now: Date) {
	const looking: Context = { db, shopId, memberId: 0, role: 'reader', now };
	return inShop(looking, (tx) =>
		tx
			.selectDistinctOn([part.id], { tag: part.tag, memberId: event.memberId })
			.from(part)
			.innerJoin(
				event,
				and(
					eq(event.shopId, part.shopId),
					eq(event.about, 'part'),
					eq(event.aboutId, part.id),
					inArray(event.what, ['hold', 'undo'])
				)
			)
			.where(and(eq(part.shopId, shopId), eq(part.state, 'held'), lte(part.heldUntil, now)))
			.orderBy(part.id, desc(event.id))
	);
}
