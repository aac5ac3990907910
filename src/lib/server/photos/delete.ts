import { NotFound } from '$lib/refusal';
import { and, eq, gte, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { keptSince } from './keep';
import { photo } from './tables';

const setDeleted = (ctx: Context, id: number, deleted: boolean): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const [row] = await tx
			.update(photo)
			.set({ deletedAt: deleted ? ctx.now : null })
			.where(
				and(
					eq(photo.shopId, ctx.shopId),
					eq(photo.id, id),
					deleted ? isNull(photo.deletedAt) : gte(photo.deletedAt, keptSince(ctx.now))
				)
			)
			.returning({ id: photo.id });
		if (!row) throw new NotFound();
		const what = deleted ? 'took the photo away' : 'put the photo back';
		await record(tx, ctx, { about: 'photo', aboutId: id, what });
	});

/** Hides a photo; its bytes stay, so that it can be put back. */
export const deletePhoto = (ctx: Context, id: number): Promise<void> => setDeleted(ctx, id, true);

export const restorePhoto = (ctx: Context, id: number): Promise<void> => setDeleted(ctx, id, false);
