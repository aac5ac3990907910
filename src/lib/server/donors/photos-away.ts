import { SHOT_SAID } from '$lib/donors/shots';
import type { PhotoRemoved } from '$lib/photos/view';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { removedAmong } from '../photos';
import { donorRow } from './rows';
import { donorPhoto } from './tables';

/** The photos of a donor that were taken away and can be put back. */
export const removedDonorPhotos = (ctx: Context, ref: string): Promise<PhotoRemoved[]> =>
	inShop(ctx, async (tx, ctx) => {
		const { id: donorId } = await donorRow(tx, ctx, ref);
		const ties = await tx
			.select({ id: donorPhoto.photoId, shot: donorPhoto.shot })
			.from(donorPhoto)
			.where(and(eq(donorPhoto.shopId, ctx.shopId), eq(donorPhoto.donorId, donorId)));
		const shots = new Map(ties.map(({ id, shot }) => [id, SHOT_SAID[shot]]));
		const removed = await removedAmong(tx, ctx, [...shots.keys()]);
		return removed.map((one) => ({ ...one, alt: shots.get(one.id) ?? '' }));
	});
