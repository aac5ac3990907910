import { BIN_UNDO_DAYS, binHappened, mayUndoBin } from '$lib/bins/history';
import { NotFound, Refused } from '$lib/refusal';
import { and, desc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { alone } from '../db/alone';
import { allow, record } from '../people';
import { event } from '../people/tables';
import { addressTaken } from './add';
import { retireBin, useBinAgain } from './retire';
import { bin } from './tables';

export type BinEvent = typeof event.$inferSelect;

/** The event of a bin that is to be taken back: still the newest, and not too old. Null: it is about something else. */
export async function binEvent(tx: Tx, ctx: Context, eventId: number): Promise<BinEvent | null> {
	allow(ctx, 'work');
	const own = and(eq(event.shopId, ctx.shopId), eq(event.about, 'bin'));
	const [asked] = await tx
		.select()
		.from(event)
		.where(and(own, eq(event.id, eventId)));
	if (!asked) return null;
	await tx
		.select({ id: bin.id })
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, asked.aboutId)))
		.for('no key update');
	const [newest] = await tx
		.select({ id: event.id })
		.from(event)
		.where(and(own, eq(event.aboutId, asked.aboutId)))
		.orderBy(desc(event.id))
		.limit(1);
	if (newest?.id !== eventId)
		throw new Refused(
			'changed',
			'Something else was done with this bin since. Look at its history.'
		);
	if (!mayUndoBin(asked.what))
		throw new Refused('gate', `${binHappened(asked)}: this stays in the history.`);
	if (ctx.now.getTime() - asked.at.getTime() > BIN_UNDO_DAYS * 24 * 3600 * 1000)
		throw new Refused('gate', `This was more than ${BIN_UNDO_DAYS} days ago. Change it by hand.`);
	return asked;
}

export const recordUndone = (tx: Tx, ctx: Context, undone: BinEvent): Promise<number> =>
	record(tx, ctx, {
		about: 'bin',
		aboutId: undone.aboutId,
		what: 'undone',
		fromState: undone.toState,
		toState: undone.fromState,
		detail: { undone: undone.id, said: binHappened(undone) }
	});

async function asBefore(tx: Tx, ctx: Context, { aboutId, detail }: BinEvent): Promise<void> {
	const before = detail.before as Partial<typeof bin.$inferInsert> & { address?: string };
	const own = and(eq(bin.shopId, ctx.shopId), eq(bin.id, aboutId));
	const [row] = await tx.select({ version: bin.version }).from(bin).where(own);
	if (!row) throw new NotFound();
	const saved = tx
		.update(bin)
		.set({ ...before, version: row.version + 1 })
		.where(own);
	await alone(saved, 'bin_address', addressTaken(before.address ?? ''));
}

async function tagOf(tx: Tx, ctx: Context, binId: number): Promise<string> {
	const [row] = await tx
		.select({ tag: bin.tag })
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, binId)));
	if (!row) throw new NotFound();
	return row.tag;
}

/** Takes back a change of a bin, other than a merge: a rack made, an edit, taking out of use. */
export const undoBin = (ctx: Context, eventId: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		const undone = await binEvent(tx, ctx, eventId);
		if (!undone) throw new NotFound();
		if (undone.what === 'retired') {
			await useBinAgain(ctx, await tagOf(tx, ctx, undone.aboutId));
			return;
		}
		if (undone.what === 'rack made')
			for (const tag of undone.detail.tags as string[]) await retireBin(ctx, tag);
		else if (undone.what === 'edited') await asBefore(tx, ctx, undone);
		else throw new NotFound();
		await recordUndone(tx, ctx, undone);
	});
