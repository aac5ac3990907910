import { and, eq, lte } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { letterSettings } from '../customers';
import type { Db } from '../db';
import { changeWant, wantRow } from './rows';
import { want } from './tables';

const DAY_MS = 86_400_000;

const isTold = (ctx: Context, before: Date) =>
	and(eq(want.shopId, ctx.shopId), eq(want.state, 'told'), lte(want.toldAt, before));

/** Wants that were told so long ago, by the shop's own figure, have gone quiet; written under who took them. */
export async function quietWants(db: Db, shopId: number, now: Date): Promise<number> {
	const looking: Context = { db, shopId, memberId: 0, role: 'reader', now };
	const { quietDays } = await letterSettings(looking);
	const before = new Date(now.getTime() - quietDays * DAY_MS);
	const rows = await inShop(looking, (tx, ctx) =>
		tx.select().from(want).where(isTold(ctx, before))
	);
	for (const { number, memberId } of rows)
		await inShop({ ...looking, memberId }, async (tx, ctx) => {
			const row = await wantRow(tx, ctx, String(number), 'lock');
			const isStill = row.state === 'told' && row.toldAt !== null && row.toldAt <= before;
			if (isStill) await changeWant(tx, ctx, row, 'quiet', {});
		});
	return rows.length;
}
