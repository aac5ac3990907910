import type { PriceView, RemovedPrice } from '$lib/prices/view';
import { NotFound, Refused } from '$lib/refusal';
import { findKind } from '$lib/trade';
import { and, desc, eq, gte, isNull, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { event, member } from '../people/tables';
import { getPrice } from './queries';
import { price } from './tables';

type Row = typeof price.$inferSelect;

/** How long a removed price can be put back. */
const KEPT_DAYS = 30;

/** Takes a price off the list. Gives the event it can be put back by. */
export const removePrice = (ctx: Context, id: number, version: number): Promise<number> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const mine = and(eq(price.shopId, ctx.shopId), eq(price.id, id));
		const [before] = await tx.select().from(price).where(mine).for('update');
		if (!before) throw new NotFound('This price is not on the list any more');
		if (before.version !== version)
			throw new Refused(
				'changed',
				'Somebody changed this price meanwhile. Look at it and remove it again.'
			);
		await tx.delete(price).where(mine);
		return record(tx, ctx, { about: 'price', aboutId: id, what: 'removed', detail: { before } });
	});

const since = (ctx: Context) => new Date(ctx.now.getTime() - KEPT_DAYS * 86_400_000);

const removals = (ctx: Context) =>
	and(
		eq(event.shopId, ctx.shopId),
		eq(event.about, 'price'),
		eq(event.what, 'removed'),
		gte(event.at, since(ctx))
	);

const rowIn = (detail: Record<string, unknown>) => detail.before as Row;

/** What was removed in the last 30 days and is not back, newest first. */
export const listRemoved = (ctx: Context): Promise<RemovedPrice[]> =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.selectDistinctOn([event.aboutId], {
				id: event.id,
				at: event.at,
				by: member.name,
				detail: event.detail
			})
			.from(event)
			.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
			.leftJoin(price, and(eq(price.shopId, event.shopId), eq(price.id, event.aboutId)))
			.where(and(removals(ctx), isNull(price.id)))
			.orderBy(event.aboutId, desc(event.id))
			.limit(200);
		return rows
			.map(({ id, at, by, detail }) => {
				const { kind, engine, number, newCents } = rowIn(detail);
				return {
					event: id,
					at,
					by,
					kindName: findKind(kind)?.name ?? kind,
					engine,
					number,
					newCents
				};
			})
			.sort((a, b) => b.event - a.event)
			.slice(0, 20);
	});

/** Puts a removed price back as it was; refused where another stands for the same thing by now. */
export const putBackPrice = (ctx: Context, eventId: number): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const [gone] = await tx
			.select()
			.from(event)
			.where(and(removals(ctx), eq(event.id, eventId)));
		if (!gone) throw new NotFound('This price cannot be put back any more');
		const { version, ...before } = rowIn(gone.detail);
		const [back] = await tx
			.insert(price)
			.values({
				...before,
				shopId: ctx.shopId,
				id: sql`${gone.aboutId}`,
				version: version + 1,
				changedAt: ctx.now
			})
			.onConflictDoNothing()
			.returning({ id: price.id });
		if (!back)
			throw new Refused(
				'taken',
				'There is a price for the same thing on the list by now. Change that one.'
			);
		await record(tx, ctx, { about: 'price', aboutId: back.id, what: 'put back' });
		return getPrice(ctx, back.id);
	});
