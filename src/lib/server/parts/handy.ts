import type { KindTile } from '$lib/parts/logging';
import { kind, kinds } from '$lib/trade';
import { and, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
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

export interface HandyBin {
	address: string;
	purpose: string;
	parts: number;
}

/** The bins where parts of this kind lie, fullest first. */
export const binsFor = (ctx: Context, kindId: string): Promise<HandyBin[]> =>
	inShop(ctx, async (tx) =>
		tx
			.select({
				address: bin.address,
				purpose: bin.purpose,
				parts: sql<number>`count(*)::int`
			})
			.from(part)
			.innerJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
			.where(
				and(
					eq(part.shopId, ctx.shopId),
					eq(part.kind, kindId),
					isNotNull(part.binId),
					isNull(bin.retiredAt),
					eq(bin.red, false)
				)
			)
			.groupBy(bin.id, bin.address, bin.purpose)
			.orderBy(desc(sql`count(*)`), bin.address)
			.limit(4)
	);

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
