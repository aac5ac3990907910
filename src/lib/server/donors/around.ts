import type { DonorShot } from '$lib/donors/words';
import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { photo } from '../photos/tables';
import { noMistake } from './parts-of';
import type { ReleaseRow } from './rows';
import { box, donorPhoto, release } from './tables';

export interface Around {
	boxes: { donorId: number; tag: string }[];
	photos: { donorId: number; id: number; shot: DonorShot; blur: string }[];
	releases: Map<number, ReleaseRow>;
	parts: Map<number, number>;
}

const photosOf = (tx: Tx, ctx: Context, ids: number[]) =>
	tx
		.select({
			donorId: donorPhoto.donorId,
			id: donorPhoto.photoId,
			shot: donorPhoto.shot,
			blur: photo.blur
		})
		.from(donorPhoto)
		.innerJoin(photo, and(eq(photo.shopId, donorPhoto.shopId), eq(photo.id, donorPhoto.photoId)))
		.where(
			and(
				eq(donorPhoto.shopId, ctx.shopId),
				inArray(donorPhoto.donorId, ids),
				isNull(photo.deletedAt)
			)
		)
		.orderBy(asc(donorPhoto.photoId));

const boxesOf = (tx: Tx, ctx: Context, ids: number[]) =>
	tx
		.select({ donorId: box.donorId, tag: box.tag })
		.from(box)
		.where(and(eq(box.shopId, ctx.shopId), inArray(box.donorId, ids)))
		.orderBy(asc(box.id));

const partCounts = (tx: Tx, ctx: Context, ids: number[]) =>
	tx
		.select({ donorId: part.donorId, count: sql<number>`count(*)::int` })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), inArray(part.donorId, ids), noMistake))
		.groupBy(part.donorId);

/** What belongs to these donors, in four queries for any number of them. */
export async function around(tx: Tx, ctx: Context, ids: number[]): Promise<Around> {
	if (ids.length === 0) return { boxes: [], photos: [], releases: new Map(), parts: new Map() };
	const boxes = await boxesOf(tx, ctx, ids);
	const photos = await photosOf(tx, ctx, ids);
	const releases = await tx
		.select()
		.from(release)
		.where(and(eq(release.shopId, ctx.shopId), inArray(release.donorId, ids)))
		.orderBy(asc(release.id));
	const counts = await partCounts(tx, ctx, ids);
	return {
		boxes,
		photos,
		releases: new Map(releases.map((row) => [row.donorId, row])),
		parts: new Map(counts.map((row) => [row.donorId ?? 0, row.count]))
	};
}
