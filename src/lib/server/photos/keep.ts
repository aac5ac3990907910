import { PHOTO_SIZES } from '$lib/photos/links';
import { randomUUID } from 'node:crypto';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { putKey } from '../storage';
import { cleanPhoto } from './clean';
import { photo } from './tables';

/** A cleaned picture that is in the store and has no row yet. */
export interface KeptPhoto {
	key: string;
	width: number;
	height: number;
	bytes: number;
}

/** The keys of a shop stand under its number, so that the sweep can ask each shop for its own. */
export const shopPrefix = (shopId: number) => `${shopId}/`;

/** Cleans the upload and puts its sizes into the store: before any transaction, the row comes after. */
export async function keepPhoto(ctx: Context, upload: Buffer): Promise<KeptPhoto> {
	allow(ctx, 'work');
	if (ctx.tx) throw new Error('A photo goes to the store before the transaction, never inside it');
	const { width, height, sizes } = await cleanPhoto(upload);
	const key = `${shopPrefix(ctx.shopId)}${randomUUID()}`;
	await Promise.all(
		PHOTO_SIZES.map((size) => putKey(`${key}/${size}.webp`, sizes[size], 'image/webp'))
	);
	const bytes = PHOTO_SIZES.reduce((sum, size) => sum + sizes[size].length, 0);
	return { key, width, height, bytes };
}

/** The row of a picture that is in the store. */
export const addPhotoRow = (ctx: Context, kept: KeptPhoto): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const [row] = await tx
			.insert(photo)
			.values({ shopId: ctx.shopId, takenAt: ctx.now, ...kept })
			.returning({ id: photo.id });
		return row!;
	});

export const savePhoto = async (ctx: Context, upload: Buffer): Promise<{ id: number }> =>
	addPhotoRow(ctx, await keepPhoto(ctx, upload));
