import { NotFound } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { wantRow, type Done, type WantRow } from './rows';
import { wantMatch } from './tables';
import { markSeen } from './tell';

const note = (tx: Tx, ctx: Context, row: WantRow, what: string, detail: Record<string, unknown>) =>
	record(tx, ctx, {
		...{ about: 'want', aboutId: row.id, what, detail },
		...{ fromState: row.state, toState: row.state }
	} as const);

/** Somebody looked at what is here for a want and leaves it at that. */
export const seeWant = (ctx: Context, ref: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref, 'lock');
		await markSeen(tx, ctx, row);
		return { number: row.number, eventId: await note(tx, ctx, row, 'seen', {}) };
	});

/** What was found is not the one: it is shown for this want no more, nor counted. */
export const dropMatch = (ctx: Context, ref: string, match: number): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref, 'lock');
		const [dropped] = await tx
			.update(wantMatch)
			.set({ droppedAt: ctx.now, seenAt: ctx.now })
			.where(
				and(eq(wantMatch.shopId, ctx.shopId), eq(wantMatch.wantId, row.id), eq(wantMatch.id, match))
			)
			.returning({ id: wantMatch.id });
		if (!dropped) throw new NotFound();
		return { number: row.number, eventId: await note(tx, ctx, row, 'not this', { match }) };
	});
