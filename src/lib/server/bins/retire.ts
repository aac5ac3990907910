import { NotFound, Refused } from '$lib/refusal';
import { and, eq, isNotNull, isNull, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { record } from '../people';
import { addressTaken } from './add';
import { findPlace, getBin } from './queries';
import { bin } from './tables';

/** Takes an empty bin out of use; its address is free again. Returns its tag, to bring it back by. */
export const retireBin = (ctx: Context, ref: string): Promise<{ tag: string; address: string }> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await findPlace(tx, ctx, ref, { lock: true });
		if (!row) throw new NotFound();
		const { contents } = await getBin(ctx, row.tag);
		if (contents.length > 0) {
			const tags = contents.slice(0, 3).map((part) => part.tag);
			const more = contents.length > 3 ? ` and ${contents.length - 3} more` : '';
			throw new Refused('gate', `Move what is in ${row.address} first: ${tags.join(', ')}${more}.`);
		}
		await tx
			.update(bin)
			.set({ retiredAt: ctx.now, version: row.version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, row.id)));
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'retired',
			fromState: 'in use',
			toState: 'retired'
		});
		return { tag: row.tag, address: row.address };
	});

/** Brings a retired bin back into use under its address. */
export const useBinAgain = (ctx: Context, tag: string): Promise<{ address: string }> =>
	inShop(ctx, async (tx, ctx) => {
		const [row] = await tx
			.select()
			.from(bin)
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.tag, tag), isNotNull(bin.retiredAt)))
			.for('update');
		if (!row) throw new NotFound();
		const [other] = await tx
			.select({ id: bin.id })
			.from(bin)
			.where(
				and(
					eq(bin.shopId, ctx.shopId),
					eq(sql`upper(${bin.address})`, row.address.toUpperCase()),
					isNull(bin.retiredAt)
				)
			);
		if (other) throw addressTaken(row.address);
		await tx
			.update(bin)
			.set({ retiredAt: null, version: row.version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, row.id)));
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'in use again',
			fromState: 'retired',
			toState: 'in use'
		});
		return { address: row.address };
	});
