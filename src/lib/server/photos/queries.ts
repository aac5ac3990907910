import type { PhotoSize } from '$lib/photos/links';
import { may } from '$lib/people/role';
import { NotFound } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import type { Readable } from 'node:stream';
import { inShop, type Context } from '../context';
import { getKey } from '../storage';
import { keptSince } from './keep';
import { photo } from './tables';

/** One that was taken away shows its thumb to those who can put it back, and nothing else. */
const isThere = (ctx: Context, deletedAt: Date | null, size: PhotoSize) =>
	deletedAt === null ||
	(size === 'thumb' && may(ctx.role, 'work') && deletedAt >= keptSince(ctx.now));

/** The bytes of one size; a photo of another shop, or one that was taken away, is not there. */
export async function readPhoto(ctx: Context, id: number, size: PhotoSize): Promise<Readable> {
	const key = await inShop(ctx, async (tx) => {
		const [row] = await tx
			.select({ key: photo.key, deletedAt: photo.deletedAt })
			.from(photo)
			.where(and(eq(photo.shopId, ctx.shopId), eq(photo.id, id)));
		if (!row || !isThere(ctx, row.deletedAt, size)) throw new NotFound();
		return row.key;
	});
	return getKey(`${key}/${size}.webp`);
}
