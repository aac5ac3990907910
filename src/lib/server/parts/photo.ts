import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { addPhotoRow, keepPhoto, type KeptPhoto } from '../photos';
import { changePart, partFor, partRow, type Done } from './row';
import { partPhoto } from './tables';

/** A picture that is in the store already becomes one of the part's. */
export const hangPhoto = (
	ctx: Context,
	tag: string,
	kept: KeptPhoto
): Promise<Done & { id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'photo');
		const id = await hangKept(tx, ctx, row.id, kept);
		return { ...(await changePart(tx, ctx, row, 'photo', {}, { photo: id })), id };
	});

/** The row of a kept picture and its tie to the part; the event is the caller's. */
export async function hangKept(
	tx: Tx,
	ctx: Context,
	partId: number,
	kept: KeptPhoto
): Promise<number> {
	const { id } = await addPhotoRow({ ...ctx, tx }, kept);
	await tx.insert(partPhoto).values({ shopId: ctx.shopId, partId, photoId: id });
	return id;
}

/** Cleans a picture, puts it into the store, then onto the part. */
export async function addPartPhoto(ctx: Context, tag: string, bytes: Buffer) {
	allow(ctx, 'work');
	await inShop(ctx, (tx, ctx) => partRow(tx, ctx, tag));
	return hangPhoto(ctx, tag, await keepPhoto(ctx, bytes));
}
