import { freeNumber } from '$lib/parts/box/pins';
import { UNDO_DAYS } from '$lib/parts/history';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq, inArray } from 'drizzle-orm';
import { isDeepStrictEqual } from 'node:util';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { sayNumber } from '$lib/donors/reference';
import { donorRow } from '../donors';
import { donor } from '../donors/tables';
import { allow, record } from '../people';
import { event } from '../people/tables';
import { donorPhotoRow } from './pinned-photo';
import { numbersOn, ownPin, placeOfPin, recordPin, type PinPlace } from './pins';
import { rulerRow, standing } from './rulers';
import { pin, ruler } from './tables';
import { undoPart } from './undo';

type Event = typeof event.$inferSelect;
const LATER = 'Something else was done here since. Look at the photo.';

/** Takes back what was done last, newest first: moves of parts, pins and rulers. All of it, or nothing. */
export const undoChanges = (ctx: Context, eventIds: readonly number[]): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		for (const id of [...eventIds].sort((a, b) => b - a)) {
			const [found] = await tx
				.select()
				.from(event)
				.where(
					and(
						...[eq(event.shopId, ctx.shopId), eq(event.id, id)],
						inArray(event.about, ['part', 'donor'])
					)
				);
			if (!found) throw new NotFound();
			if (found.about === 'part') await undoPart(ctx, id);
			else await undoOnPhoto(tx, ctx, found);
		}
	});

async function undoOnPhoto(tx: Tx, ctx: Context, done: Event): Promise<void> {
	const { pin, photo } = done.detail;
	if (typeof photo !== 'number' || !('before' in done.detail))
		throw new Refused('gate', 'This stays in the history. Change it by hand.');
	if (ctx.now.getTime() - done.at.getTime() > UNDO_DAYS * 24 * 3600 * 1000)
		throw new Refused('gate', `This was more than ${UNDO_DAYS} days ago. Change it by hand.`);
	const [row] = await tx
		.select({ number: donor.number })
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, done.aboutId)));
	await donorRow(tx, ctx, sayNumber(row!.number), { lock: true });
	await donorPhotoRow(tx, ctx, done.aboutId, photo);
	if (typeof pin === 'number') await undoPin(tx, ctx, pin, done.detail);
	else await undoRuler(tx, ctx, photo, done);
}

async function undoPin(tx: Tx, ctx: Context, id: number, detail: Event['detail']): Promise<void> {
	const [row] = await tx.select().from(pin).where(ownPin(ctx, id));
	if (!row) throw new NotFound();
	const now = placeOfPin(row);
	if (!isDeepStrictEqual(now, detail.after)) throw new Refused('changed', LATER);
	const before = detail.before as PinPlace | null;
	const { removed, ...place } = before ?? { ...now, removed: true };
	const taken = row.removedAt === null ? [] : await numbersOn(tx, ctx, row.photoId);
	const n = taken.includes(place.n) ? freeNumber(taken) : place.n;
	const [next] = await tx
		.update(pin)
		.set({ ...place, n, removedAt: removed ? ctx.now : null })
		.where(ownPin(ctx, id))
		.returning();
	await recordPin(tx, ctx, removed ? 'took away the pin' : 'put back the pin', next!, now);
}

async function undoRuler(tx: Tx, ctx: Context, photoId: number, done: Event): Promise<void> {
	const row = await rulerRow(tx, ctx, photoId);
	const now = row && standing(row);
	if (!isDeepStrictEqual(now, done.detail.after)) throw new Refused('changed', LATER);
	const before = done.detail.before as ReturnType<typeof standing> | null;
	const on = and(eq(ruler.shopId, ctx.shopId), eq(ruler.photoId, photoId));
	if (before) await tx.update(ruler).set(before).where(on);
	else await tx.delete(ruler).where(on);
	await record(tx, ctx, {
		about: 'donor',
		aboutId: done.aboutId,
		what: before ? 'put back the ruler on a photo' : 'took away the ruler on a photo',
		detail: { photo: photoId, before: now, after: before }
	});
}
