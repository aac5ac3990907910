import type { DonorPart } from '$lib/donors/view';
import { MISTAKE } from '$lib/parts/state';
import { findKind } from '$lib/trade';
import { and, asc, eq, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { box } from './tables';

/** What was logged by mistake was never a part of the donor. */
export const noMistake = sql`${part.scrapReason} is distinct from ${MISTAKE}`;

/** The parts logged from a donor, in the order they came off. */
export async function donorParts(tx: Tx, ctx: Context, donorId: number): Promise<DonorPart[]> {
	const rows = await tx
		.select({
			id: part.id,
			tag: part.tag,
			kind: part.kind,
			label: part.label,
			grade: part.grade,
			state: part.state,
			place: sql<string | null>`coalesce(${bin.address}, ${box.tag})`
		})
		.from(part)
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.leftJoin(box, and(eq(box.shopId, part.shopId), eq(box.id, part.boxId)))
		.where(and(eq(part.shopId, ctx.shopId), eq(part.donorId, donorId), noMistake))
		.orderBy(asc(part.id));
	return rows.map((row) => ({ ...row, kindName: findKind(row.kind)?.name ?? row.kind }));
}
