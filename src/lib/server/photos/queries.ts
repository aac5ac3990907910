import type { PhotoSize } from '$lib/photos/links';
import { NotFound } from '$lib/refusal';
import { and, eq, isNull } from 'drizzle-orm';
import type { Readable } from 'node:stream';
import { inShop, type Context } from '../context';
import { getKey } from '../storage';
import { photo } from './tables';

/** The bytes of one size; a photo of another shop, or a deleted one, is not there. */
export async function readPhoto(ctx: Context, id: number, size: PhotoSize): Promise<Readable> {
	const key = await inShop(ctx, async (tx) => {
		const [row] = await tx
			.select({ key: photo.key })
			.from(photo)
			.where(and(eq(photo.shopId, ctx.shopId), eq(photo.id, id), isNull(photo.deletedAt)));
		if (!row) throw new NotFound();
		return row.key;
	});
	return getKey(`${key}/${size}.webp`);
}
