import type { YesInput } from '$lib/wants/input';
import { wantSaid } from '$lib/wants/state';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { freePart, getPart, holdPart } from '../parts';
import { part } from '../parts/tables';
import { and, eq } from 'drizzle-orm';
import { changeWant, wantFor, type Done, type WantRow } from './rows';
import { markSeen } from './tell';

/** They take it; a part that is named is held for them. On its tag and in its history stands the want, never a name. */
export const sayYes = (ctx: Context, ref: string, { part: tag }: YesInput): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'yes');
		await markSeen(tx, ctx, row);
		if (!tag) return changeWant(tx, ctx, row, 'yes', {});
		await holdPart(ctx, tag, { for: wantSaid(row.number) });
		const { id, tag: kept } = await getPart(ctx, tag);
		return changeWant(tx, ctx, row, 'yes', { partId: id }, { tag: kept });
	});

/** Lets go of what was held for a want, where it still is. */
export async function letGo(tx: Tx, ctx: Context, row: WantRow): Promise<{ partId: null }> {
	const nothing = { partId: null };
	if (row.partId === null) return nothing;
	const [kept] = await tx
		.select({ tag: part.tag, state: part.state, heldFor: part.heldFor })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.id, row.partId)));
	if (kept?.state === 'held' && kept.heldFor === wantSaid(row.number))
		await freePart(ctx, kept.tag);
	return nothing;
}

/** They do not want it. */
export const sayNo = (ctx: Context, ref: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'no');
		await markSeen(tx, ctx, row);
		return changeWant(tx, ctx, row, 'no', await letGo(tx, ctx, row));
	});

/** They have it, from here or elsewhere. What is held for them stays held until it is handed over. */
export const closeWant = (ctx: Context, ref: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'close');
		await markSeen(tx, ctx, row);
		return changeWant(tx, ctx, row, 'close', {});
	});

/** The shop gives it up. */
export const takeOffWant = (ctx: Context, ref: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'take off');
		await markSeen(tx, ctx, row);
		return changeWant(tx, ctx, row, 'take off', await letGo(tx, ctx, row));
	});

/** They wait again, whatever was said before. */
export const waitOn = (ctx: Context, ref: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'wait on');
		const set = { ...(await letGo(tx, ctx, row)), toldAt: null, toldBy: null };
		return changeWant(tx, ctx, row, 'wait on', set);
	});
