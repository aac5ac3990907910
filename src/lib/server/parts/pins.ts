import { freeNumber } from '$lib/parts/box/pins';
import type { Pin, PinChange } from '$lib/parts/box/input';
import { NotFound } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow, type DonorRow } from '../donors';
import { allow, record } from '../people';
import { marked } from './pin-marks';
import { donorPhotoRow } from './pinned-photo';
import { pin } from './tables';

export type PinRow = typeof pin.$inferSelect;
/** What stands in a pin's row that can be changed and put back. */
export type PinPlace = Pick<PinRow, 'n' | 'x' | 'y' | 'kind' | 'partId'> & { removed: boolean };

export const placeOfPin = ({ n, x, y, kind, partId, removedAt }: PinRow): PinPlace => ({
	...{ n, x, y, kind, partId },
	removed: removedAt !== null
});

export interface PinDone {
	id: number;
	n: number;
	/** The event that can be undone. */
	eventId: number;
}

export const ownPin = (ctx: Context, id: number) => and(eq(pin.shopId, ctx.shopId), eq(pin.id, id));

/** The numbers in use on a photo; the donor is locked, so nobody takes one meanwhile. */
export const numbersOn = async (tx: Tx, ctx: Context, photoId: number): Promise<number[]> => {
	const on = and(eq(pin.shopId, ctx.shopId), eq(pin.photoId, photoId), isNull(pin.removedAt));
	return (await tx.select({ n: pin.n }).from(pin).where(on)).map((row) => row.n);
};

/** Writes that a pin is there now as it is, with what stood there before. */
export const recordPin = (
	tx: Tx,
	ctx: Context,
	what: string,
	row: PinRow,
	before: PinPlace | null
): Promise<number> =>
	record(tx, ctx, {
		about: 'donor',
		aboutId: row.donorId,
		what,
		detail: {
			...{ pin: row.id, photo: row.photoId, before, after: placeOfPin(row) },
			said: `${row.n}, ${kind(row.kind).name}`
		}
	});

/** Puts a numbered pin on a photo of the donor. */
export const placePin = (ctx: Context, ref: string, input: Pin): Promise<PinDone> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await donorRow(tx, ctx, ref, { lock: true });
		await donorPhotoRow(tx, ctx, donor.id, input.photo);
		const { photo: photoId, x, y } = input;
		const [row] = await tx
			.insert(pin)
			.values({
				...{ shopId: ctx.shopId, donorId: donor.id, photoId, x, y },
				n: freeNumber(await numbersOn(tx, ctx, photoId)),
				...(await marked(tx, ctx, donor, input))
			})
			.returning();
		return { id: row!.id, n: row!.n, eventId: await recordPin(tx, ctx, 'pinned', row!, null) };
	});

async function changed(
	ctx: Context,
	ref: string,
	id: number,
	what: string,
	set: (tx: Tx, ctx: Context, donor: DonorRow) => Promise<Partial<PinRow>>
): Promise<PinDone> {
	return inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await donorRow(tx, ctx, ref, { lock: true });
		const theirs = and(ownPin(ctx, id), eq(pin.donorId, donor.id), isNull(pin.removedAt));
		const [row] = await tx.select().from(pin).where(theirs);
		if (!row) throw new NotFound();
		await donorPhotoRow(tx, ctx, donor.id, row.photoId);
		const [next] = await tx
			.update(pin)
			.set(await set(tx, ctx, donor))
			.where(ownPin(ctx, id))
			.returning();
		const eventId = await recordPin(tx, ctx, what, next!, placeOfPin(row));
		return { id, n: row.n, eventId };
	});
}

/** Moves a pin, or lets it mark something else. */
export const changePin = (ctx: Context, ref: string, { pin, x, y, what }: PinChange) =>
	changed(ctx, ref, pin, what ? 'changed the pin' : 'moved the pin', async (tx, ctx, donor) => ({
		...(x === undefined || y === undefined ? {} : { x, y }),
		...(what ? await marked(tx, ctx, donor, what) : {})
	}));

export const removePin = (ctx: Context, ref: string, id: number) =>
	changed(ctx, ref, id, 'took away the pin', async (_tx, ctx) => ({ removedAt: ctx.now }));
