import type { BenchDone } from '$lib/parts/bench/view';
import { kind } from '$lib/trade';
import { and, eq, inArray, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { event, member } from '../people/tables';
import { offDonor } from './off-donor';
import { part } from './tables';

const MOST = 30;

/** The first and the newest event of each of these parts. */
async function events(tx: Tx, ctx: Context, ids: readonly number[]) {
	const about = and(
		...[eq(event.shopId, ctx.shopId), eq(event.about, 'part')],
		inArray(event.aboutId, [...ids])
	);
	const ends = tx
		.select({
			partId: event.aboutId,
			first: sql<number>`min(${event.id})`.mapWith(Number).as('first'),
			last: sql<number>`max(${event.id})`.mapWith(Number).as('last')
		})
		.from(event)
		.where(about)
		.groupBy(event.aboutId)
		.as('ends');
	return tx
		.select({ partId: ends.partId, first: ends.first, last: ends.last, at: event.at, by: member })
		.from(ends)
		.innerJoin(event, and(eq(event.shopId, ctx.shopId), eq(event.id, ends.first)))
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)));
}

/** The parts that came off a donor, the newest first; the newest that nothing was done with since can be undone. */
export async function partsDone(tx: Tx, ctx: Context, donorId: number): Promise<BenchDone[]> {
	const rows = await tx
		.select({ part, bin: bin.address })
		.from(part)
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.where(offDonor(ctx, donorId))
		.orderBy(sql`${part.id} desc`)
		.limit(MOST);
	if (rows.length === 0) return [];
	const known = await events(
		tx,
		ctx,
		rows.map((row) => row.part.id)
	);
	const of = new Map(known.map((one) => [one.partId, one]));
	return rows.flatMap(({ part: row, bin }): BenchDone[] => {
		const pulled = of.get(row.id);
		if (!pulled) return [];
		const { tag, grade, state, destroyed } = row;
		const who = { by: pulled.by.name, mine: pulled.by.id === ctx.memberId, at: pulled.at };
		const undo = pulled.first === pulled.last ? pulled.first : null;
		const said = { kind: row.kind, kindName: kind(row.kind).name, place: bin };
		return [{ tag, ...said, grade, state, destroyed, ...who, undo }];
	});
}
