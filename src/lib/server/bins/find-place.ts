import { readAddress } from '$lib/bins/address';
import { readTag } from '$lib/codes';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { bin } from './tables';

export type BinRow = typeof bin.$inferSelect;

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
