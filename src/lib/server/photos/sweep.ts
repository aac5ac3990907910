import { and, eq, inArray, lt } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { listKeys, removeKeys } from '../storage';
import { keptSince, shopPrefix } from './keep';
import { photo } from './tables';

const GRACE_MS = 60 * 60_000;
const BATCH = 500;

const photoKey = (stored: string) => stored.slice(0, stored.lastIndexOf('/'));

/** Which of these keys have no row in the shop. */
const withoutRow = (ctx: Context, stored: string[]): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const asked = [...new Set(stored.map(photoKey))];
		const rows = await tx
			.select({ key: photo.key })
			.from(photo)
			.where(and(eq(photo.shopId, ctx.shopId), inArray(photo.key, asked)));
		const known = new Set(rows.map((row) => row.key));
		return stored.filter((key) => !known.has(photoKey(key)));
	});

const forgetDeleted = (ctx: Context): Promise<unknown> =>
	inShop(ctx, (tx) =>
		tx
			.delete(photo)
			.where(and(eq(photo.shopId, ctx.shopId), lt(photo.deletedAt, keptSince(ctx.now))))
	);

/**
 * Removes the rows of one shop's photos that were taken away long ago, then from the store what has no row
 * an hour after it was put there. Returns how many keys.
 */
export async function sweepPhotos(ctx: Context): Promise<number> {
	await forgetDeleted(ctx);
	const before = ctx.now.getTime() - GRACE_MS;
	const old: string[] = [];
	for await (const { key, changedAt } of listKeys(shopPrefix(ctx.shopId)))
		if (changedAt.getTime() < before) old.push(key);
	let removed = 0;
	for (let at = 0; at < old.length; at += BATCH) {
		const strays = await withoutRow(ctx, old.slice(at, at + BATCH));
		await removeKeys(strays);
		removed += strays.length;
	}
	return removed;
}
