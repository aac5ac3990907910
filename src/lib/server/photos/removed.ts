import type { PhotoRemoved } from '$lib/photos/view';
import { photoLinks } from '$lib/photos/links';
import { and, desc, eq, gte, inArray } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { getShop } from '../people';
import { event, member } from '../people/tables';
import { keptSince } from './keep';
import { photo } from './tables';

/** Who took each of these photos away last. */
async function takers(tx: Tx, ctx: Context, ids: number[]): Promise<Map<number, string>> {
	const rows = await tx
		.select({ id: event.aboutId, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'photo'), inArray(event.aboutId, ids)))
		.orderBy(event.id);
	return new Map(rows.map((row) => [row.id, row.by]));
}

/** Which of these photos were taken away and can still be put back, the last one first. */
export async function removedAmong(
	tx: Tx,
	ctx: Context,
	ids: number[]
): Promise<Omit<PhotoRemoved, 'alt'>[]> {
	if (ids.length === 0) return [];
	const rows = await tx
		.select({ id: photo.id, at: photo.deletedAt })
		.from(photo)
		.where(
			and(
				eq(photo.shopId, ctx.shopId),
				inArray(photo.id, ids),
				gte(photo.deletedAt, keptSince(ctx.now))
			)
		)
		.orderBy(desc(photo.deletedAt), desc(photo.id));
	if (rows.length === 0) return [];
	const by = await takers(
		tx,
		ctx,
		rows.map(({ id }) => id)
	);
	const { slug } = await getShop(ctx);
	return rows.map(({ id, at }) => ({
		id,
		at: at!,
		by: by.get(id) ?? '',
		thumb: photoLinks(slug, id).thumb
	}));
}
