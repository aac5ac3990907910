import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { donor } from '../donors/tables';
import { own } from './row';
import { part } from './tables';
import { wordsOf } from './words-of';

/** A donor was read better: its parts are found and priced by the engine that it is now. */
export const followDonor = (ctx: Context, donorId: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		const [from] = await tx
			.select({ engineKey: donor.engineKey })
			.from(donor)
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, donorId)));
		if (!from) return;
		const rows = await tx
			.select()
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), eq(part.donorId, donorId)))
			.orderBy(part.id)
			.for('no key update');
		for (const row of rows) {
			const searchText = await wordsOf(tx, ctx, row);
			await tx.update(part).set({ searchText, engineKey: from.engineKey }).where(own(ctx, row.id));
		}
	});
