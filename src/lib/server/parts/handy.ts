import { whereTo, type Suggestion } from '$lib/bins/where-to';
import type { KindTile } from '$lib/parts/logging';
import { kind, kinds } from '$lib/trade';
import { desc, eq, sql } from 'drizzle-orm';
import { shelves } from '../bins';
import { inShop, type Context } from '../context';
import { event } from '../people/tables';
import { part } from './tables';

/** Who parts were held for or fitted on lately, newest first: nobody types a job twice. */
export const recentFor = (ctx: Context): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const { rows } = await tx.execute<{ said: string }>(sql`
			select coalesce(e.detail->>'for', e.detail->>'job') as said
			from ${event} e
			where e.shop_id = ${ctx.shopId} and e.about = 'part' and e.what in ('hold', 'fit')
			group by 1 order by max(e.id) desc limit 6`);
		return rows.map((row) => row.said);
	});

/** The best places for a part of this kind, each with why: its own kind first, never full, too high or beside what harms it. */
export const binsFor = (
	ctx: Context,
	kindId: string,
	grams: number | null = null
): Promise<Suggestion[]> =>
	inShop(ctx, async (tx, ctx) => whereTo({ kind: kindId, grams }, await shelves(tx, ctx), 4));

/** The kinds that the shop logs most, filled up with those that are called for most. */
export const usualKinds = (ctx: Context): Promise<KindTile[]> =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.select({ kind: part.kind })
			.from(part)
			.where(eq(part.shopId, ctx.shopId))
			.groupBy(part.kind)
			.orderBy(desc(sql`count(*)`), part.kind)
			.limit(24);
		const called = kinds
			.filter((each) => each.reuse !== 'never')
			.toSorted((a, b) => b.callsPerYear - a.callsPerYear)
			.map((each) => each.id);
		const ids = [...new Set([...rows.map((row) => row.kind), ...called])].slice(0, 24);
		return ids.map((id) => ({ kind: id, kindName: kind(id).name, system: kind(id).system }));
	});
