import { MISTAKE } from '$lib/parts/state';
import type { PartItem } from '$lib/parts/view';
import { and, asc, eq, isNull, ne, or } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { partsByIds } from './items';
import { part } from './tables';

/** The parts that came off a donor; what was logged by mistake does not count. */
export const offDonor = (ctx: Context, donorId: number) =>
	and(
		eq(part.shopId, ctx.shopId),
		eq(part.donorId, donorId),
		or(isNull(part.scrapReason), ne(part.scrapReason, MISTAKE))
	);

/** How many parts were logged off a donor; what was logged by mistake does not count. */
export const countDonorParts = (ctx: Context, donorId: number): Promise<number> =>
	inShop(ctx, (tx) => tx.$count(part, offDonor(ctx, donorId)));

/** The kinds that were logged off a donor. */
export async function loggedKinds(tx: Tx, ctx: Context, donorId: number): Promise<Set<string>> {
	const rows = await tx
		.selectDistinct({ kind: part.kind })
		.from(part)
		.where(offDonor(ctx, donorId));
	return new Set(rows.map((row) => row.kind));
}

/** The parts logged off a donor, oldest first. */
export const listDonorParts = (ctx: Context, donorId: number): Promise<PartItem[]> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await tx
			.select({ id: part.id })
			.from(part)
			.where(offDonor(ctx, donorId))
			.orderBy(asc(part.id));
		return partsByIds(
			ctx,
			rows.map(({ id }) => id)
		);
	});
