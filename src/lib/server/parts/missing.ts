import { and, desc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { event } from '../people/tables';
import { changePart, partFor, type Done, type PartRow } from './row';

/** Not found where it should be; it keeps its place, so that whoever finds it knows where it belongs. */
export const missPart = (ctx: Context, tag: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'miss');
		return changePart(tx, ctx, row, 'miss', { state: 'missing', heldFor: null, heldUntil: null });
	});

/** It turned up where it belongs. */
export const foundPart = (ctx: Context, tag: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'find');
		const doubtful = (await stateBefore(tx, ctx, row)) === 'back';
		return changePart(tx, ctx, row, 'find', { state: doubtful ? 'back' : restingState(row) });
	});

async function stateBefore(tx: Tx, ctx: Context, row: PartRow) {
	const [missed] = await tx
		.select({ from: event.fromState })
		.from(event)
		.where(
			and(
				eq(event.shopId, ctx.shopId),
				eq(event.about, 'part'),
				eq(event.aboutId, row.id),
				eq(event.what, 'miss')
			)
		)
		.orderBy(desc(event.id))
		.limit(1);
	return missed?.from ?? null;
}

/** Put away, or still lying about as it was pulled. */
export const restingState = (row: Pick<PartRow, 'binId' | 'boxId'>) =>
	row.binId !== null || row.boxId !== null ? 'shelved' : 'pulled';
