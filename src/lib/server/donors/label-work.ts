import type { SeenText } from '$lib/photos/seen';
import { and, eq } from 'drizzle-orm';
import { buffer } from 'node:stream/consumers';
import { inShop, type Context } from '../context';
import { faultSaid, log } from '../log';
import { readPhoto, readText } from '../photos';
import { labelReading } from './tables';

const mine = (ctx: Context, id: number) =>
	and(eq(labelReading.shopId, ctx.shopId), eq(labelReading.id, id));

async function textOn(ctx: Context, photoId: number): Promise<SeenText | null> {
	try {
		return await readText(await buffer(await readPhoto(ctx, photoId, 'full')));
	} catch (fault) {
		log().warn({ photoId, ...faultSaid(fault) }, 'a plate could not be read');
		return null;
	}
}

/** Does a reading that was asked for; done before, or taken away, it is left as it is. */
export async function fillReading(ctx: Context, id: number): Promise<void> {
	const photoId = await inShop(ctx, async (tx) => {
		const [row] = await tx.select().from(labelReading).where(mine(ctx, id));
		return row?.state === 'waits' ? row.photoId : null;
	});
	if (photoId === null) return;
	const seen = await textOn(ctx, photoId);
	await inShop(ctx, (tx) =>
		tx
			.update(labelReading)
			.set({ state: seen ? 'read' : 'failed', readAt: new Date(), ...seen })
			.where(mine(ctx, id))
	);
}
