import { photoLinks } from '$lib/photos/links';
import { and, eq, inArray, isNull, min } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { getShop } from '../people';
import { photo } from '../photos/tables';
import { part, partPhoto } from './tables';

/** The first photo of each part that has one, by the part's tag, for lists that know parts by their tags. */
export const firstPhotos = (ctx: Context, tags: string[]): Promise<Record<string, string>> =>
	inShop(ctx, async (tx, ctx) => {
		if (tags.length === 0) return {};
		const rows = await tx
			.select({ tag: part.tag, photoId: min(partPhoto.photoId) })
			.from(part)
			.innerJoin(partPhoto, and(eq(partPhoto.shopId, part.shopId), eq(partPhoto.partId, part.id)))
			.innerJoin(photo, and(eq(photo.shopId, partPhoto.shopId), eq(photo.id, partPhoto.photoId)))
			.where(and(eq(part.shopId, ctx.shopId), inArray(part.tag, tags), isNull(photo.deletedAt)))
			.groupBy(part.tag);
		const { slug } = await getShop(ctx);
		return Object.fromEntries(
			rows.map((row) => [row.tag, photoLinks(slug, Number(row.photoId)).thumb])
		);
	});
