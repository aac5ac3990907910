import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { mintTag } from '../tags';
import { donorRow } from './rows';
import { box } from './tables';

export async function addBoxRow(
	tx: Tx,
	ctx: Context,
	donorId: number,
	blank?: string
): Promise<{ tag: string }> {
	const tag = await mintTag(tx, ctx, 'box', blank);
	await tx.insert(box).values({ shopId: ctx.shopId, donorId, tag, createdAt: ctx.now });
	return { tag };
}

/** One more box for a donor, when one does not hold it all; with the blank tag that hangs on it, if one does. */
export const addBox = (ctx: Context, ref: string, blank?: string): Promise<{ tag: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const { tag } = await addBoxRow(tx, ctx, row.id, blank);
		await record(tx, ctx, {
			about: 'donor',
			aboutId: row.id,
			what: 'got another box',
			detail: { tag }
		});
		return { tag };
	});
