import { binsToCount } from '$lib/walks/count';
import { and, asc, eq, inArray, isNull } from 'drizzle-orm';
import { lastCounted, shelves, type BinRow } from '../bins';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { walk, walkStop } from './tables';
import type { ToDo } from './to-walk';

/** The bins whose turn it is to be counted; those on a count that still goes on are left out. */
export async function countStops(tx: Tx, ctx: Context): Promise<ToDo[]> {
	const bins = await shelves(tx, ctx);
	const when = await lastCounted(tx, ctx);
	const onIt = await tx
		.selectDistinct({ binId: walkStop.binId })
		.from(walkStop)
		.innerJoin(walk, and(eq(walk.shopId, walkStop.shopId), eq(walk.id, walkStop.walkId)))
		.where(and(eq(walkStop.shopId, ctx.shopId), eq(walk.what, 'count'), isNull(walk.endedAt)));
	const free = bins.filter((bin) => !onIt.some(({ binId }) => binId === bin.id));
	const due = binsToCount(free.map((bin) => ({ ...bin, lastCounted: when.get(bin.id) ?? null })));
	const stops: ToDo[] = [];
	for (const bin of due) stops.push(...(await inBin(tx, ctx, bin)));
	return stops;
}

async function inBin(tx: Tx, ctx: Context, bin: BinRow): Promise<ToDo[]> {
	const rows = await tx
		.select({ id: part.id, state: part.state })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				eq(part.binId, bin.id),
				inArray(part.state, ['shelved', 'held', 'back', 'missing'])
			)
		)
		.orderBy(asc(part.kind), asc(part.pulledAt), asc(part.id));
	if (rows.length === 0) return [{ partId: null, binId: bin.id, why: '' }];
	return rows.map(({ id, state }) => ({
		...{ partId: id, binId: bin.id },
		why: state === 'missing' ? 'missing: look again' : ''
	}));
}
