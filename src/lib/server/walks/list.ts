import type { WalkChoices, WalkItem } from '$lib/walks/view';
import { and, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import { lastCounted, shelves } from '../bins';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { member } from '../people/tables';
import { walk, walkStop } from './tables';
import { toFetch, toPutAway } from './to-walk';

/** A walk with how far it is. */
export const walkItems = (tx: Tx) =>
	tx
		.select({
			id: walk.id,
			what: walk.what,
			by: member.name,
			startedAt: walk.startedAt,
			endedAt: walk.endedAt,
			total: sql<number>`count(*)::int`,
			done: sql<number>`(count(*) filter (where ${walkStop.outcome} is not null))::int`
		})
		.from(walk)
		.innerJoin(member, and(eq(member.shopId, walk.shopId), eq(member.id, walk.startedBy)))
		.innerJoin(walkStop, and(eq(walkStop.shopId, walk.shopId), eq(walkStop.walkId, walk.id)))
		.groupBy(walk.shopId, walk.id, member.name)
		.$dynamic();

/** The walks that go on, and the last that are over, the newest first. */
export const listWalks = (ctx: Context): Promise<{ open: WalkItem[]; over: WalkItem[] }> =>
	inShop(ctx, async (tx, ctx) => {
		const own = eq(walk.shopId, ctx.shopId);
		return {
			open: await walkItems(tx)
				.where(and(own, isNull(walk.endedAt)))
				.orderBy(desc(walk.id))
				.limit(50),
			over: await walkItems(tx)
				.where(and(own, isNotNull(walk.endedAt)))
				.orderBy(desc(walk.endedAt), desc(walk.id))
				.limit(20)
		};
	});

async function lastPurge(tx: Tx, ctx: Context): Promise<Date | null> {
	const [row] = await tx
		.select({ at: walk.startedAt })
		.from(walk)
		.where(and(eq(walk.shopId, ctx.shopId), eq(walk.what, 'purge')))
		.orderBy(desc(walk.id))
		.limit(1);
	return row?.at ?? null;
}

/** What each walk would be about now. */
export const walkChoices = (ctx: Context): Promise<WalkChoices> =>
	inShop(ctx, async (tx, ctx) => {
		const bins = await shelves(tx, ctx);
		const when = await lastCounted(tx, ctx);
		const counts = bins.map((bin) => when.get(bin.id)?.getTime() ?? 0);
		const oldest = counts.length ? Math.min(...counts) : 0;
		const held = await toFetch(tx, ctx);
		return {
			putAway: (await toPutAway(tx, ctx)).length,
			fetch: held.length,
			heldFor: [...new Set(held.flatMap((one) => one.heldFor ?? []))].sort(),
			bins: bins.length,
			oldestCount: oldest === 0 ? null : new Date(oldest),
			lastPurge: await lastPurge(tx, ctx)
		};
	});
