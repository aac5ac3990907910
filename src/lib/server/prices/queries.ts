import { engineKey, numberKey } from '$lib/codes/number';
import { isStale } from '$lib/prices/stale';
import type { PriceView } from '$lib/prices/view';
import { NotFound } from '$lib/refusal';
import { findKind } from '$lib/trade';
import { and, asc, count, desc, eq, ne, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { getPolicy } from '../people';
import { matching, SORTED_BY, type PriceFilter } from './filter';
import { nextAfter, placeAfter } from './page-after';
import { price } from './tables';

type Row = typeof price.$inferSelect;

const viewOf = (row: Row, ctx: Context, staleDays: number): PriceView => {
	const { id, kind, engine, number, newCents, copyCents, source, seenOn, version } = row;
	const kindName = findKind(kind)?.name ?? kind;
	const stale = isStale(seenOn, ctx.now, staleDays);
	return {
		id,
		kind,
		kindName,
		engine,
		number,
		newCents,
		copyCents,
		source,
		seenOn,
		stale,
		version
	};
};

/** A page of the price list, with how many there are in all. */
export const listPrices = (
	ctx: Context,
	filter: PriceFilter = {}
): Promise<{ items: PriceView[]; total: number; next: string | null }> =>
	inShop(ctx, async (tx, ctx) => {
		const { staleDays } = await getPolicy(ctx);
		const { sort = 'kind', down = false } = filter;
		const limit = Math.min(Math.max(Math.floor(filter.limit ?? 50), 1), 200);
		const { of, as } = SORTED_BY[sort];
		const where = matching(ctx, filter, staleDays);
		const after = placeAfter(filter.cursor, as);
		const beyond = after
			? sql`(${of}, ${price.id}) ${down ? sql`<` : sql`>`} (${after.value}::${sql.raw(as)}, ${after.id}::bigint)`
			: undefined;
		const way = down ? desc : asc;
		const rows = await tx
			.select({ row: price, sorted: sql<string | number>`${of}` })
			.from(price)
			.where(and(where, beyond))
			.orderBy(way(of), way(price.id))
			.limit(limit + 1);
		const [all] = await tx.select({ total: count() }).from(price).where(where);
		const shown = rows.slice(0, limit);
		const last = rows.length > limit ? shown.at(-1) : undefined;
		return {
			items: shown.map(({ row }) => viewOf(row, ctx, staleDays)),
			total: all?.total ?? 0,
			next: last ? nextAfter(last.sorted, last.row.id) : null
		};
	});

export const getPrice = (ctx: Context, id: number): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
		const [row] = await tx
			.select()
			.from(price)
			.where(and(eq(price.shopId, ctx.shopId), eq(price.id, id)));
		if (!row) throw new NotFound('This price is not on the list');
		return viewOf(row, ctx, (await getPolicy(ctx)).staleDays);
	});

/** The engines that the list has prices for, to suggest while typing. */
export const pricedEngines = (ctx: Context): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.selectDistinctOn([price.engineKey], { engine: price.engine })
			.from(price)
			.where(and(eq(price.shopId, ctx.shopId), ne(price.engineKey, '')))
			.orderBy(price.engineKey)
			.limit(500);
		return rows.map(({ engine }) => engine);
	});

/** The price of just this kind, engine and number, or null. */
export const findPrice = (
	ctx: Context,
	what: { kind: string; engine: string; number: string }
): Promise<PriceView | null> =>
	inShop(ctx, async (tx, ctx) => {
		const [row] = await tx
			.select()
			.from(price)
			.where(
				and(
					eq(price.shopId, ctx.shopId),
					eq(price.kind, what.kind),
					eq(price.engineKey, engineKey(what.engine)),
					eq(price.numberKey, numberKey(what.number))
				)
			);
		return row ? viewOf(row, ctx, (await getPolicy(ctx)).staleDays) : null;
	});
