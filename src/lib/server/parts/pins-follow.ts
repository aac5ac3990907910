import { followers } from '$lib/parts/box/pins';
import { and, eq, inArray, isNull } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { pin } from './tables';

/** The pins of a kind still to be pulled become those of the part that was pulled. */
export async function pinsFollow(
	tx: Tx,
	ctx: Context,
	{ id, donorId, kind }: { id: number; donorId: number; kind: string }
): Promise<void> {
	const waiting = and(
		...[eq(pin.shopId, ctx.shopId), eq(pin.donorId, donorId), eq(pin.kind, kind)],
		...[isNull(pin.partId), isNull(pin.removedAt)]
	);
	const ids = followers(await tx.select().from(pin).where(waiting));
	if (ids.length === 0) return;
	await tx
		.update(pin)
		.set({ partId: id })
		.where(and(eq(pin.shopId, ctx.shopId), inArray(pin.id, ids)));
}

/** The part was logged by mistake: its pins wait for their kind again. */
export const pinsGoBack = (tx: Tx, ctx: Context, partId: number): Promise<unknown> =>
	tx
		.update(pin)
		.set({ partId: null })
		.where(and(eq(pin.shopId, ctx.shopId), eq(pin.partId, partId)));
