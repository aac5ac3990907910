import { readAddress } from '$lib/bins/address';
import type { BinItem, BinView } from '$lib/bins/view';
import { readTag } from '$lib/codes';
import { may } from '$lib/people/role';
import { NotFound } from '$lib/refusal';
import { findKind } from '$lib/trade';
import { and, asc, eq, isNotNull, isNull, notInArray, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import { bin } from './tables';

export type BinRow = typeof bin.$inferSelect;

const inside = notInArray(part.state, ['out', 'scrapped']);

const item = (ctx: Context, row: BinRow, parts: number): BinItem => ({
	id: row.id,
	tag: row.tag,
	address: row.address,
	rack: row.rack,
	shelf: row.shelf,
	slot: row.slot,
	size: row.size,
	litres: row.litres,
	yearlyCostCents: may(ctx.role, 'see costs') ? row.yearlyCostCents : null,
	purpose: row.purpose,
	place: row.place,
	red: row.red,
	version: row.version,
	parts
});

const listWhere = (ctx: Context, retired: boolean): Promise<BinItem[]> =>
	inShop(ctx, async (tx) => {
		const counts = await tx
			.select({ binId: part.binId, parts: sql<number>`count(*)::int` })
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), isNotNull(part.binId), inside))
			.groupBy(part.binId);
		const partsIn = new Map(counts.map((row) => [row.binId, row.parts]));
		const rows = await tx
			.select()
			.from(bin)
			.where(
				and(eq(bin.shopId, ctx.shopId), retired ? isNotNull(bin.retiredAt) : isNull(bin.retiredAt))
			)
			.orderBy(asc(bin.rack), asc(bin.shelf), asc(bin.slot), asc(bin.address), asc(bin.id));
		return rows.map((row) => item(ctx, row, partsIn.get(row.id) ?? 0));
	});

/** The bins in use, by rack, shelf and slot. */
export const listBins = (ctx: Context) => listWhere(ctx, false);

/** The bins that were taken out of use. */
export const listRetiredBins = (ctx: Context) => listWhere(ctx, true);

/**
 * A bin in use by its address or its tag, however typed; null when there is none. Whoever puts something
 * in shares its lock, so that it is not retired meanwhile.
 */
export async function findPlace(
	tx: Tx,
	ctx: Context,
	typed: string,
	lock?: 'share' | 'no key update'
): Promise<BinRow | null> {
	const live = and(eq(bin.shopId, ctx.shopId), isNull(bin.retiredAt));
	const by = async (which: ReturnType<typeof eq>) => {
		const asked = tx.select().from(bin).where(and(live, which));
		const [row, other] = await (lock ? asked.for(lock) : asked);
		return row && !other ? row : null;
	};
	const byAddress = await by(eq(sql`upper(${bin.address})`, readAddress(typed).address));
	if (byAddress) return byAddress;
	const read = readTag(typed);
	const byTag = 'tag' in read ? await by(eq(bin.tag, read.tag)) : null;
	return byTag ?? by(eq(bareAddress, typed.toUpperCase().replace(/[^0-9A-Z]/g, '')));
}

/** n21 is N2-1 too, where nothing else goes by it. */
const bareAddress = sql`upper(regexp_replace(${bin.address}, '[^0-9A-Za-z]', '', 'g'))`;

/** The place for failed, doubtful or returned parts, if the shop has named one. */
export async function redBin(tx: Tx, ctx: Context): Promise<BinRow | null> {
	const [row] = await tx
		.select()
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), eq(bin.red, true), isNull(bin.retiredAt)))
		.orderBy(asc(bin.id))
		.limit(1)
		.for('share');
	return row ?? null;
}

const contentsOf = async (tx: Tx, ctx: Context, binId: number): Promise<BinView['contents']> => {
	const rows = await tx
		.select({
			tag: part.tag,
			kind: part.kind,
			label: part.label,
			grade: part.grade,
			state: part.state,
			engine: sql<string>`coalesce(nullif(trim(${donor.maker} || ' ' || ${donor.model}), ''), ${part.engine})`
		})
		.from(part)
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.where(and(eq(part.shopId, ctx.shopId), eq(part.binId, binId), inside))
		.orderBy(asc(part.kind), asc(part.id));
	return rows.map((row) => ({ ...row, kindName: findKind(row.kind)?.name ?? row.kind }));
};

export const getBin = (ctx: Context, addressOrTag: string): Promise<BinView> =>
	inShop(ctx, async (tx) => {
		const row = await findPlace(tx, ctx, addressOrTag);
		if (!row) throw new NotFound();
		const contents = await contentsOf(tx, ctx, row.id);
		return { ...item(ctx, row, contents.length), contents };
	});
