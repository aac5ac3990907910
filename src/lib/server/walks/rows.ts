import { NotFound, Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { allow } from '../people';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { walk, walkStop } from './tables';

export type WalkRow = typeof walk.$inferSelect;
export type StopRow = typeof walkStop.$inferSelect;

export const ofWalk = (ctx: Context, id: number) =>
	and(eq(walk.shopId, ctx.shopId), eq(walk.id, id));
export const stopsOf = (ctx: Context, id: number) =>
	and(eq(walkStop.shopId, ctx.shopId), eq(walkStop.walkId, id));

/** The row of a walk, locked where it is about to change: answers of two phones come one after the other. */
export async function walkRow(
	tx: Tx,
	ctx: Context,
	id: number,
	lock: 'lock' | 'look' = 'look'
): Promise<WalkRow> {
	const asked = tx.select().from(walk).where(ofWalk(ctx, id));
	const [row] = await (lock === 'lock' ? asked.for('no key update') : asked);
	if (!row) throw new NotFound();
	return row;
}

/** A walk that goes on, locked. */
export async function openWalk(tx: Tx, ctx: Context, id: number): Promise<WalkRow> {
	allow(ctx, 'work');
	const row = await walkRow(tx, ctx, id, 'lock');
	if (row.endedAt)
		throw new Refused('taken', 'This walk is over. Go on with it from its page first.');
	return row;
}

export async function stopRow(tx: Tx, ctx: Context, id: number, n: number): Promise<StopRow> {
	const [row] = await tx
		.select()
		.from(walkStop)
		.where(and(stopsOf(ctx, id), eq(walkStop.n, n)));
	if (!row) throw new NotFound();
	return row;
}

export type PartRow = typeof part.$inferSelect;

export async function partOf(tx: Tx, ctx: Context, id: number): Promise<PartRow> {
	const [row] = await tx
		.select()
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.id, id)))
		.for('no key update');
	if (!row) throw new NotFound();
	return row;
}

/** Writes what was said at a stop; without a word, the stop is open again. */
export const sayAt = (
	tx: Tx,
	ctx: Context,
	walkId: number,
	n: number,
	said: Pick<StopRow, 'outcome' | 'note' | 'eventId'>
) =>
	tx
		.update(walkStop)
		.set({
			...said,
			memberId: said.outcome === null ? null : ctx.memberId,
			at: said.outcome === null ? null : ctx.now
		})
		.where(and(stopsOf(ctx, walkId), eq(walkStop.n, n)));
