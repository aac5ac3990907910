import { NotFound } from '$lib/refusal';
import { and, desc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { photo } from '../photos/tables';
import { enqueue } from '../queue';
import { donorRow } from './rows';
import { donorPhoto, labelReading } from './tables';

/** So long a reading may take, its place in the queue counted; after that it may be asked for again. */
const PATIENCE_MS = 120_000;

export const READ_LABEL = 'donors.read-plate';

async function needPhoto(tx: Tx, ctx: Context, donorId: number, photoId: number): Promise<void> {
	const [row] = await tx
		.select({ id: photo.id })
		.from(donorPhoto)
		.innerJoin(photo, and(eq(photo.shopId, donorPhoto.shopId), eq(photo.id, donorPhoto.photoId)))
		.where(
			and(
				...[eq(donorPhoto.shopId, ctx.shopId), eq(donorPhoto.donorId, donorId)],
				...[eq(donorPhoto.photoId, photoId), isNull(photo.deletedAt)]
			)
		);
	if (!row) throw new NotFound();
}

/** One that is on its way already, so that a second tap asks for nothing. */
async function onItsWay(tx: Tx, ctx: Context, donorId: number, photoId: number) {
	const [row] = await tx
		.select({ id: labelReading.id, state: labelReading.state, askedAt: labelReading.askedAt })
		.from(labelReading)
		.where(
			and(
				...[eq(labelReading.shopId, ctx.shopId), eq(labelReading.donorId, donorId)],
				eq(labelReading.photoId, photoId)
			)
		)
		.orderBy(desc(labelReading.id))
		.limit(1);
	const fresh = row && ctx.now.getTime() - row.askedAt.getTime() < PATIENCE_MS;
	return fresh && row.state === 'waits' ? row : null;
}

/** Asks for the text on one of a donor's photos; it is read by a job, a second or three later. */
export const askReading = (ctx: Context, ref: string, photoId: number): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id: donorId } = await donorRow(tx, ctx, ref, { lock: true });
		await needPhoto(tx, ctx, donorId, photoId);
		const before = await onItsWay(tx, ctx, donorId, photoId);
		if (before) return { id: before.id };
		const { shopId, memberId, now: askedAt } = ctx;
		const [row] = await tx
			.insert(labelReading)
			.values({ shopId, donorId, photoId, memberId, askedAt, state: 'waits' })
			.returning({ id: labelReading.id });
		const { id } = row!;
		await record(tx, ctx, {
			about: 'donor',
			aboutId: donorId,
			what: 'had the plate read',
			detail: { reading: id, photo: photoId }
		});
		await enqueue(tx, READ_LABEL, { shopId, memberId, id }, `read-plate:${shopId}:${id}`);
		return { id };
	});
