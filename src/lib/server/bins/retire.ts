import { NotFound, Refused } from '$lib/refusal';
import { and, eq, isNotNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { alone } from '../db/alone';
import { allow, record } from '../people';
import { addressTaken } from './add';
import { findPlace } from './find-place';
import { getBin } from './queries';
import { bin } from './tables';

/** Takes an empty bin out of use; its address is free again. Returns its tag, to bring it back by. */
export const retireBin = (
	ctx: Context,
	ref: string
): Promise<{ tag: string; address: string; eventId: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await findPlace(tx, ctx, ref, 'no key update');
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
		const eventId = await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'retired',
			fromState: 'in use',
			toState: 'retired'
		});
		return { tag: row.tag, address: row.address, eventId };
	});

/** Brings a retired bin back into use under its address. */
export const useBinAgain = (ctx: Context, tag: string): Promise<{ address: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const [row] = await tx
			.select()
			.from(bin)
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.tag, tag), isNotNull(bin.retiredAt)))
			.for('no key update');
		if (!row) throw new NotFound();
		const back = tx
			.update(bin)
			.set({ retiredAt: null, version: row.version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, row.id)));
		await alone(back, 'bin_address', addressTaken(row.address));
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'in use again',
			fromState: 'retired',
			toState: 'in use'
		});
		return { address: row.address };
	});
