import { usualGrams } from '$lib/bins/nature';
import { flagsOf, fullness, holds, usedGrams, usedLitres, type Held } from '$lib/bins/room';
import type { BinRoom } from '$lib/bins/view';
import { findKind } from '$lib/trade';
import { and, asc, eq, isNotNull, isNull, notInArray, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import type { BinRow } from './find-place';
import { bin } from './tables';

/** Which parts count as lying in a bin: a missing one belongs there, but takes no room. */
const takesRoom = notInArray(part.state, ['out', 'scrapped', 'missing']);

/** What lies in the bins of the shop, or in one of them, by kind. */
export async function heldIn(tx: Tx, ctx: Context, binId?: number): Promise<Map<number, Held[]>> {
	const which = binId === undefined ? isNotNull(part.binId) : eq(part.binId, binId);
	const rows = await tx
		.select({
			binId: sql<number>`${part.binId}`.mapWith(Number),
			kind: part.kind,
			count: sql<number>`count(*)::int`,
			grams: sql<number>`coalesce(sum(${part.massGrams}), 0)::int`,
			unweighed: sql<number>`(count(*) filter (where ${part.massGrams} is null))::int`
		})
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), which, takesRoom))
		.groupBy(part.binId, part.kind)
		.orderBy(asc(part.binId), asc(part.kind));
	const held = new Map<number, Held[]>();
	for (const { binId, kind, count, grams, unweighed } of rows) {
		const known = findKind(kind);
		if (!known) continue;
		const one = { kind, count, grams: grams + unweighed * usualGrams(known) };
		held.set(binId, [...(held.get(binId) ?? []), one]);
	}
	return held;
}

/** The room in a bin with these contents. */
export function roomOf(row: BinRow, contents: readonly Held[]): BinRoom {
	const bin = { ...row, contents };
	return {
		holds: holds(bin),
		litres: Math.round(usedLitres(bin) * 10) / 10,
		grams: usedGrams(bin),
		fullness: Math.round(fullness(bin) * 100) / 100,
		flags: flagsOf(bin)
	};
}

/** The bins in use with what lies in each, for the rule that says where to put a part. */
export async function shelves(
	tx: Tx,
	ctx: Context
): Promise<(BinRow & { contents: readonly Held[] })[]> {
	const held = await heldIn(tx, ctx);
	const rows = await tx
		.select()
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), isNull(bin.retiredAt)))
		.orderBy(asc(bin.id));
	return rows.map((row) => ({ ...row, contents: held.get(row.id) ?? [] }));
}
