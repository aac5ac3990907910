import { isOpen } from '$lib/wants/state';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Db } from '../db';
import { letGo } from './answer';
import { changeWant, ownWant } from './rows';
import { want } from './tables';

interface Erased {
	shopId: number;
	memberId: number;
	customerId: number;
	at: string;
}

/** A customer was deleted: nobody waits any more, and what was noted about them goes. */
export async function forgetCustomer(
	db: Db,
	{ shopId, memberId, customerId, at }: Erased
): Promise<void> {
	const who: Context = { db, shopId, memberId, role: 'owner', now: new Date(at) };
	await inShop(who, async (tx, ctx) => {
		const rows = await tx
			.select()
			.from(want)
			.where(and(eq(want.shopId, ctx.shopId), eq(want.customerId, customerId)))
			.for('no key update');
		for (const row of rows) {
			if (isOpen(row.state)) {
				const gone = { ...(await letGo(tx, ctx, row)), state: 'taken off', note: '' } as const;
				await changeWant(tx, ctx, row, 'erased', gone);
			} else await tx.update(want).set({ note: '' }).where(ownWant(ctx, row.id));
		}
	});
}
