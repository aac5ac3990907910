import type { BinItem, BinPart, BinView } from '$lib/bins/view';
import type { Held } from '$lib/bins/room';
import { may } from '$lib/people/role';
import { NotFound } from '$lib/refusal';
import { findKind } from '$lib/trade';
import { and, asc, eq, isNotNull, isNull, notInArray, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part, proof } from '../parts/tables';
import { walk, walkStop } from '../walks/tables';
import { findPlace, type BinRow } from './find-place';
import { historyOf } from './history';
import { heldIn, roomOf } from './room';
import { bin } from './tables';

const inside = notInArray(part.state, ['out', 'scrapped']);

const item = (ctx: Context, row: BinRow, parts: number, held: readonly Held[]): BinItem => ({
	id: row.id,
	tag: row.tag,
	address: row.address,
	rack: row.rack,
	shelf: row.shelf,
	slot: row.slot,
	size: row.size,
	litres: row.litres,
	loadKg: row.loadKg,
	yearlyCostCents: may(ctx.role, 'see costs') ? row.yearlyCostCents : null,
	uses: row.uses,
	kinds: row.kinds,
	purpose: row.purpose,
	place: row.place,
	red: row.red,
	version: row.version,
	parts,
	room: roomOf(row, held)
});

const listWhere = (ctx: Context, retired: boolean): Promise<BinItem[]> =>
	inShop(ctx, async (tx) => {
		const counts = await tx
			.select({ binId: part.binId, parts: sql<number>`count(*)::int` })
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), isNotNull(part.binId), inside))
			.groupBy(part.binId);
		const partsIn = new Map(counts.map((row) => [row.binId, row.parts]));
		const held = await heldIn(tx, ctx);
		const rows = await tx
			.select()
			.from(bin)
			.where(
				and(eq(bin.shopId, ctx.shopId), retired ? isNotNull(bin.retiredAt) : isNull(bin.retiredAt))
			)
			.orderBy(asc(bin.rack), asc(bin.shelf), asc(bin.slot), asc(bin.address), asc(bin.id));
		return rows.map((row) => item(ctx, row, partsIn.get(row.id) ?? 0, held.get(row.id) ?? []));
	});

/** The bins in use, by rack, shelf and slot. */
export const listBins = (ctx: Context) => listWhere(ctx, false);

/** The bins that were taken out of use. */
export const listRetiredBins = (ctx: Context) => listWhere(ctx, true);

const testedAt = sql<Date | null>`(
	select max(t.at) from ${proof} t
	where t.shop_id = ${part.shopId} and t.part_id = ${part.id} and t.passed)`.mapWith((at) =>
	at === null ? null : new Date(at)
);

const contentsOf = async (tx: Tx, ctx: Context, binId: number): Promise<BinPart[]> => {
	const rows = await tx
		.select({
			tag: part.tag,
			kind: part.kind,
			label: part.label,
			grade: part.grade,
			state: part.state,
			pulledAt: part.pulledAt,
			testedAt,
			engine: sql<string>`coalesce(nullif(trim(${donor.maker} || ' ' || ${donor.model}), ''), ${part.engine})`
		})
		.from(part)
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.where(and(eq(part.shopId, ctx.shopId), eq(part.binId, binId), inside))
		.orderBy(asc(part.kind), asc(part.pulledAt), asc(part.id));
	return rows.map((row) => ({ ...row, kindName: findKind(row.kind)?.name ?? row.kind }));
};

/** When somebody last looked through a bin on a walk that counts. */
export async function lastCounted(tx: Tx, ctx: Context): Promise<Map<number, Date>> {
	const rows = await tx
		.select({
			binId: walkStop.binId,
			at: sql<Date>`max(${walkStop.at})`.mapWith((at) => new Date(at))
		})
		.from(walkStop)
		.innerJoin(walk, and(eq(walk.shopId, walkStop.shopId), eq(walk.id, walkStop.walkId)))
		.where(and(eq(walkStop.shopId, ctx.shopId), eq(walk.what, 'count'), isNotNull(walkStop.at)))
		.groupBy(walkStop.binId);
	return new Map(rows.flatMap(({ binId, at }) => (binId === null ? [] : [[binId, at]])));
}

export const getBin = (ctx: Context, addressOrTag: string): Promise<BinView> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await findPlace(tx, ctx, addressOrTag);
		if (!row) throw new NotFound();
		const contents = await contentsOf(tx, ctx, row.id);
		const held = (await heldIn(tx, ctx, row.id)).get(row.id) ?? [];
		return {
			...item(ctx, row, contents.length, held),
			contents,
			lastCounted: (await lastCounted(tx, ctx)).get(row.id) ?? null,
			history: await historyOf(tx, ctx, row.id)
		};
	});
