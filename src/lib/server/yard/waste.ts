import { sayDay } from '$lib/donors/day';
import { NotFound, Refused } from '$lib/refusal';
import type { WasteEntry } from '$lib/yard/input';
import type { WasteLog } from '$lib/yard/view';
import { WASTES } from '$lib/yard/words';
import { and, desc, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { alone } from '../db/alone';
import { todayIn } from '../donors';
import { allow, record } from '../people';
import { member } from '../people/tables';
import { waste } from './tables';

const SHOWN = 200;

/** What went into the cans, or who took it away. */
export const addWaste = (ctx: Context, input: WasteEntry): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const today = await todayIn(ctx);
		const on = input.on ?? today;
		if (on > today)
			throw new Refused('bad input', `Enter a day up to today, ${sayDay(today, today)}.`, 'on');
		if (input.way === 'out' && !input.who)
			throw new Refused('bad input', 'Say who took it away.', 'who');
		const { shopId, memberId, now } = ctx;
		const [row] = await tx
			.insert(waste)
			.values({ ...input, on, shopId, memberId, at: now })
			.returning({ id: waste.id });
		await record(tx, ctx, {
			...{ about: 'shop', aboutId: shopId, what: `${input.what} ${input.way}` },
			detail: { millilitres: input.millilitres, on, who: input.who, ticket: input.ticket }
		});
		return row!;
	});

/** Takes a wrong entry out of the sums by one that says the opposite; both stay to be read. */
export const correctWaste = (ctx: Context, id: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const [row] = await tx
			.select()
			.from(waste)
			.where(and(eq(waste.shopId, ctx.shopId), eq(waste.id, id)));
		if (!row) throw new NotFound();
		const already = 'This entry is put right already.';
		if (row.correctsId) throw new Refused('gate', already);
		const { id: _, ...entry } = row;
		const way = row.way === 'in' ? 'out' : 'in';
		const put = { ...entry, way, correctsId: id, memberId: ctx.memberId, at: ctx.now } as const;
		await alone(tx.insert(waste).values(put), 'waste_corrected_once', new Refused('gate', already));
		await record(tx, ctx, {
			...{ about: 'shop', aboutId: ctx.shopId, what: `took back: ${row.what} ${row.way}` },
			detail: { id, millilitres: row.millilitres }
		});
	});

/** The log, the newest first, and what should be in the cans now. */
export const listWaste = (ctx: Context): Promise<WasteLog> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const rows = await tx
			.select({ waste, by: member.name })
			.from(waste)
			.innerJoin(member, and(eq(member.shopId, waste.shopId), eq(member.id, waste.memberId)))
			.where(eq(waste.shopId, ctx.shopId))
			.orderBy(desc(waste.id))
			.limit(SHOWN);
		const sums = await tx
			.select({
				what: waste.what,
				millilitres: sql<number>`sum(case when ${waste.way} = 'in' then ${waste.millilitres} else -${waste.millilitres} end)::int`
			})
			.from(waste)
			.where(eq(waste.shopId, ctx.shopId))
			.groupBy(waste.what);
		const put = new Set(rows.map((row) => row.waste.correctsId));
		return {
			items: rows.map(({ waste: { correctsId, ...row }, by }) => ({
				...row,
				...{ by, corrects: correctsId, corrected: put.has(row.id) }
			})),
			standing: WASTES.flatMap((what) => sums.filter((sum) => sum.what === what))
		};
	});
