import type { PhotoRemoved } from '$lib/photos/view';
import { NotFound } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { deletePhoto, removedAmong, restorePhoto } from '../photos';
import { partRow } from './row';
import { partPhoto } from './tables';

const ofPart = (
	ctx: Context,
	tag: string,
	id: number,
	what: (ctx: Context, id: number) => Promise<void>
) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id: partId } = await partRow(tx, ctx, tag);
		const [row] = await tx
			.select({ photoId: partPhoto.photoId })
			.from(partPhoto)
			.where(
				and(
					eq(partPhoto.shopId, ctx.shopId),
					eq(partPhoto.partId, partId),
					eq(partPhoto.photoId, id)
				)
			);
		if (!row) throw new NotFound();
		await what(ctx, id);
	});

export const removePartPhoto = (ctx: Context, tag: string, id: number): Promise<void> =>
	ofPart(ctx, tag, id, deletePhoto);

export const putBackPartPhoto = (ctx: Context, tag: string, id: number): Promise<void> =>
	ofPart(ctx, tag, id, restorePhoto);

/** The photos of a part that were taken away and can be put back. */
export const removedPartPhotos = (ctx: Context, tag: string): Promise<PhotoRemoved[]> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partRow(tx, ctx, tag);
		const ties = await tx
			.select({ id: partPhoto.photoId })
			.from(partPhoto)
			.where(and(eq(partPhoto.shopId, ctx.shopId), eq(partPhoto.partId, row.id)));
		const ids = ties.map(({ id }) => id);
		const alt = kind(row.kind).name;
		return (await removedAmong(tx, ctx, ids)).map((one) => ({ ...one, alt }));
	});
