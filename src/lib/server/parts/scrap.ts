import type { Scrap } from '$lib/parts/input';
import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq, gte, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { photo } from '../photos/tables';
import { changePart, partFor, type Done, type PartRow } from './row';
import { partPhoto } from './tables';

const JUST_NOW_MS = 60 * 60 * 1000;

/** A safety part leaves cut or drilled, and there is a picture of that: nobody can fit it again. */
async function needDestroyed(tx: Tx, ctx: Context, row: PartRow, input: Scrap): Promise<void> {
	const { reuse, name } = kind(row.kind);
	if (!reuse.startsWith('safety')) return;
	if (!input.destroyed)
		throw new Refused(
			'gate',
			`${name} is a safety part: cut or drill it so that nobody can fit it, then tick Destroyed.`,
			'destroyed'
		);
	const taken = and(
		eq(photo.shopId, ctx.shopId),
		gte(photo.takenAt, new Date(ctx.now.getTime() - JUST_NOW_MS)),
		isNull(photo.deletedAt)
	);
	const [seen] = await tx
		.select({ id: photo.id })
		.from(partPhoto)
		.innerJoin(photo, and(eq(photo.id, partPhoto.photoId), taken))
		.where(and(eq(partPhoto.shopId, ctx.shopId), eq(partPhoto.partId, row.id)))
		.limit(1);
	if (!seen) throw new Refused('gate', `Photograph ${name} as it is now, destroyed.`, 'file');
}

/** To the scrap, with the reason; a hold on it ends. */
export const scrapPart = (ctx: Context, tag: string, input: Scrap): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'scrap');
		await needDestroyed(tx, ctx, row, input);
		const set = {
			state: 'scrapped',
			scrapReason: input.reason,
			destroyed: input.destroyed ?? false,
			binId: null,
			boxId: null,
			heldFor: null,
			heldUntil: null
		} as const;
		return changePart(tx, ctx, row, 'scrap', set, {
			reason: input.reason,
			destroyed: input.destroyed ?? false
		});
	});
