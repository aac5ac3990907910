import { SHOT_SAID } from '$lib/donors/shots';
import type { DonorShot } from '$lib/donors/words';
import { NotFound } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { addPhotoRow, deletePhoto, keepPhoto, restorePhoto, type KeptPhoto } from '../photos';
import { donorRow } from './rows';
import { donorPhoto } from './tables';

/** Ties a picture that is in the store to a donor. */
export async function attachPhoto(
	tx: Tx,
	ctx: Context,
	donorId: number,
	kept: KeptPhoto,
	shot: DonorShot
): Promise<{ id: number }> {
	const { id } = await addPhotoRow(ctx, kept);
	await tx.insert(donorPhoto).values({ shopId: ctx.shopId, donorId, photoId: id, shot });
	await record(tx, ctx, {
		about: 'donor',
		aboutId: donorId,
		what: 'added a photo',
		detail: { id, shot }
	});
	return { id };
}

/** Ties a kept picture to the donor that is named. */
export const addKeptPhoto = (
	ctx: Context,
	ref: string,
	kept: KeptPhoto,
	shot: DonorShot
): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		return attachPhoto(tx, ctx, (await donorRow(tx, ctx, ref)).id, kept, shot);
	});

export async function addDonorPhoto(
	ctx: Context,
	ref: string,
	bytes: Buffer,
	shot: DonorShot
): Promise<{ id: number }> {
	allow(ctx, 'work');
	await inShop(ctx, (tx, ctx) => donorRow(tx, ctx, ref));
	return addKeptPhoto(ctx, ref, await keepPhoto(ctx, bytes), shot);
}

const ofDonor = (
	ctx: Context,
	ref: string,
	id: number,
	what: (ctx: Context, id: number) => Promise<void>
) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id: donorId } = await donorRow(tx, ctx, ref);
		const [row] = await tx
			.select({ photoId: donorPhoto.photoId })
			.from(donorPhoto)
			.where(
				and(
					eq(donorPhoto.shopId, ctx.shopId),
					eq(donorPhoto.donorId, donorId),
					eq(donorPhoto.photoId, id)
				)
			);
		if (!row) throw new NotFound();
		await what(ctx, id);
	});

/** Says anew what a photo shows. */
export const changeShot = (ctx: Context, ref: string, photoId: number, shot: DonorShot) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id: donorId } = await donorRow(tx, ctx, ref, { lock: true });
		const row = and(
			...[eq(donorPhoto.shopId, ctx.shopId), eq(donorPhoto.donorId, donorId)],
			eq(donorPhoto.photoId, photoId)
		);
		const [before] = await tx.select({ shot: donorPhoto.shot }).from(donorPhoto).where(row);
		if (!before) throw new NotFound();
		await tx.update(donorPhoto).set({ shot }).where(row);
		const detail = { photo: photoId, shot, was: before.shot, said: SHOT_SAID[shot] };
		await record(tx, ctx, {
			about: 'donor',
			aboutId: donorId,
			what: 'said what a photo shows',
			detail
		});
	});

export const removeDonorPhoto = (ctx: Context, ref: string, id: number) =>
	ofDonor(ctx, ref, id, deletePhoto);

export const putBackDonorPhoto = (ctx: Context, ref: string, id: number) =>
	ofDonor(ctx, ref, id, restorePhoto);
