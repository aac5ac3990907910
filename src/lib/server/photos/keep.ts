import { PHOTO_SIZES, type PhotoSize } from '$lib/photos/links';
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
	blur: string;
}

/** The keys of a shop stand under its number, so that the sweep can ask each shop for its own. */
export const shopPrefix = (shopId: number) => `${shopId}/`;

/** A photo that was taken away can be put back for so long. */
const KEPT_DAYS = 30;

/** Photos that were taken away since then can be put back. */
export const keptSince = (now: Date) => new Date(now.getTime() - KEPT_DAYS * 86_400_000);

/** Cleans the upload and puts its sizes into the store: before any transaction, the row comes after. */
export async function keepPhoto(ctx: Context, upload: Buffer): Promise<KeptPhoto> {
	allow(ctx, 'work');
	if (ctx.tx) throw new Error('A photo goes to the store before the transaction, never inside it');
	const key = `${shopPrefix(ctx.shopId)}${randomUUID()}`;
	// A size goes to the store while the next one is made.
	const puts: Promise<void>[] = [];
	const put = (size: PhotoSize, bytes: Buffer) => {
		const going = putKey(`${key}/${size}.webp`, bytes, 'image/webp');
		going.catch(() => undefined);
		puts.push(going);
	};
	const { width, height, blur, sizes } = await cleanPhoto(upload, put);
	await Promise.all(puts);
	const bytes = PHOTO_SIZES.reduce((sum, size) => sum + sizes[size].length, 0);
	return { key, width, height, bytes, blur };
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
