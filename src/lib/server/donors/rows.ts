import { dayIn } from '$lib/donors/day';
import { donorNumber } from '$lib/donors/reference';
import { canPull } from '$lib/donors/state';
import { NotFound, Refused } from '$lib/refusal';
import { readTag } from '$lib/codes';
import { and, desc, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { getShop } from '../people';
import { box, donor, release } from './tables';

export type DonorRow = typeof donor.$inferSelect;
export type ReleaseRow = typeof release.$inferSelect;
export type BoxRow = typeof box.$inferSelect;

/** The box with this tag, or null. */
export async function findBox(tx: Tx, ctx: Context, typed: string): Promise<BoxRow | null> {
	const read = readTag(typed);
	if (!('tag' in read)) return null;
	const [row] = await tx
		.select()
		.from(box)
		.where(and(eq(box.shopId, ctx.shopId), eq(box.tag, read.tag)));
	return row ?? null;
}

/** A donor by its number, D12, or by the tag of one of its boxes. A number that is also a tag is a number. */
export async function donorRow(
	tx: Tx,
	ctx: Context,
	ref: string,
	{ lock = false } = {}
): Promise<DonorRow> {
	const by = async (which: ReturnType<typeof eq>) => {
		const asked = tx
			.select()
			.from(donor)
			.where(and(eq(donor.shopId, ctx.shopId), which));
		const [row] = await (lock ? asked.for('no key update') : asked);
		return row;
	};
	const number = donorNumber(ref);
	const numbered = number === null ? undefined : await by(eq(donor.number, number));
	if (numbered) return numbered;
	const found = await findBox(tx, ctx, ref);
	const boxed = found ? await by(eq(donor.id, found.donorId)) : undefined;
	if (!boxed) throw new NotFound();
	return boxed;
}

/** The release that stands, or null. */
export async function newestRelease(
	tx: Tx,
	ctx: Context,
	donorId: number
): Promise<ReleaseRow | null> {
	const [row] = await tx
		.select()
		.from(release)
		.where(and(eq(release.shopId, ctx.shopId), eq(release.donorId, donorId)))
		.orderBy(desc(release.id))
		.limit(1);
	return row ?? null;
}

/** The day it is in the shop. */
export const todayIn = async (ctx: Context): Promise<string> =>
	dayIn((await getShop(ctx)).timeZone, ctx.now);

/** The donor, locked, if a part may be pulled from it now; refused with what opens the gate if not. */
export async function pullableDonor(tx: Tx, ctx: Context, ref: string): Promise<DonorRow> {
	const row = await donorRow(tx, ctx, ref, { lock: true });
	const ok = canPull(row, await newestRelease(tx, ctx, row.id), await todayIn(ctx));
	if (ok !== true) throw new Refused('gate', ok);
	return row;
}
