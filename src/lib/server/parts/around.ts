import { happened, mayUndo, UNDO_DAYS } from '$lib/parts/history';
import type { Happening, PartView, ProofView } from '$lib/parts/view';
import { photoLinks } from '$lib/photos/links';
import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { event, member } from '../people/tables';
import { photo } from '../photos/tables';
import { partPhoto, proof } from './tables';

/** How it was checked, oldest first. */
export const proofsOf = (tx: Tx, ctx: Context, partId: number): Promise<ProofView[]> =>
	tx
		.select({
			how: proof.how,
			figure: proof.figure,
			unit: proof.unit,
			figures: proof.figures,
			note: proof.note,
			passed: proof.passed,
			by: member.name,
			at: proof.at
		})
		.from(proof)
		.innerJoin(member, and(eq(member.shopId, proof.shopId), eq(member.id, proof.memberId)))
		.where(and(eq(proof.shopId, ctx.shopId), eq(proof.partId, partId)))
		.orderBy(asc(proof.at), asc(proof.id));

/** What happened to it, newest first; only the newest can still be undone. */
export async function historyOf(tx: Tx, ctx: Context, partId: number): Promise<Happening[]> {
	const rows = await tx
		.select({ event, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'part'), eq(event.aboutId, partId)))
		.orderBy(desc(event.id));
	const since = ctx.now.getTime() - UNDO_DAYS * 24 * 3600 * 1000;
	return rows.map(({ event: { id, at, ...one }, by }, place) => ({
		id,
		at,
		by,
		said: happened(one),
		undo: place === 0 && mayUndo(one.what) && at.getTime() >= since
	}));
}

/** Its pictures, oldest first. */
export async function photosOf(
	tx: Tx,
	ctx: Context,
	partId: number,
	slug: string,
	alt: string
): Promise<PartView['photos']> {
	const rows = await tx
		.select({ id: photo.id, blur: photo.blur })
		.from(partPhoto)
		.innerJoin(photo, and(eq(photo.shopId, partPhoto.shopId), eq(photo.id, partPhoto.photoId)))
		.where(
			and(eq(partPhoto.shopId, ctx.shopId), eq(partPhoto.partId, partId), isNull(photo.deletedAt))
		)
		.orderBy(asc(photo.id));
	return rows.map(({ id, blur }) => ({ id, blur, links: photoLinks(slug, id), alt }));
}
