import { readLabel } from '$lib/donors/label';
import type { ReadingView } from '$lib/donors/reading-view';
import { and, desc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { photo } from '../photos/tables';
import { listMakers } from './list';
import { donorRow } from './rows';
import { labelReading } from './tables';

const MOST = 20;

interface Found {
	row: typeof labelReading.$inferSelect;
	width: number;
	height: number;
}

function viewOf({ row, width, height }: Found, makers: string[]): ReadingView {
	const { id, photoId, state, turn, looks } = row;
	return {
		...{ id, photoId, state, turn, width, height },
		askedAt: row.askedAt.toISOString(),
		...readLabel({ turn, looks }, makers)
	};
}

/** What was read off a donor's photos: of each the newest, the newest first. */
export const listReadings = (ctx: Context, ref: string): Promise<ReadingView[]> =>
	inShop(ctx, async (tx, ctx) => {
		const { id: donorId } = await donorRow(tx, ctx, ref);
		const rows = await tx
			.selectDistinctOn([labelReading.photoId], {
				row: labelReading,
				width: photo.width,
				height: photo.height
			})
			.from(labelReading)
			.innerJoin(
				photo,
				and(eq(photo.shopId, labelReading.shopId), eq(photo.id, labelReading.photoId))
			)
			.where(
				and(
					...[eq(labelReading.shopId, ctx.shopId), eq(labelReading.donorId, donorId)],
					isNull(photo.deletedAt)
				)
			)
			.orderBy(desc(labelReading.photoId), desc(labelReading.id))
			.limit(MOST);
		if (rows.length === 0) return [];
		const makers = await listMakers(ctx);
		return rows.map((row) => viewOf(row, makers)).sort((a, b) => b.id - a.id);
	});
