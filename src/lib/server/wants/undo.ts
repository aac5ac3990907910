import { happened, mayUndo, type Before } from '$lib/wants/history';
import { WANT_MOVES } from '$lib/wants/state';
import type { TellBy } from '$lib/wants/words';
import { NotFound, Refused } from '$lib/refusal';
import { and, desc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { event } from '../people/tables';
import { letGo } from './answer';
import { changeWant, wantRow, type Done, type WantRow } from './rows';
import { wantMatch } from './tables';

const UNDO_DAYS = 30;

async function newestEvent(tx: Tx, ctx: Context, row: WantRow) {
	const [newest] = await tx
		.select()
		.from(event)
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'want'), eq(event.aboutId, row.id)))
		.orderBy(desc(event.id))
		.limit(1);
	if (!newest) throw new NotFound();
	return newest;
}

type Event = Awaited<ReturnType<typeof newestEvent>>;

/** What was looked at or set aside is new again. */
async function unsee(tx: Tx, ctx: Context, row: WantRow, { at, detail }: Event) {
	const mine = and(eq(wantMatch.shopId, ctx.shopId), eq(wantMatch.wantId, row.id));
	await tx
		.update(wantMatch)
		.set({ seenAt: null })
		.where(and(mine, eq(wantMatch.seenAt, at)));
	if (typeof detail.match === 'number')
		await tx
			.update(wantMatch)
			.set({ droppedAt: null })
			.where(and(mine, eq(wantMatch.id, detail.match)));
}

const moment = (kept: string | null) => (kept ? new Date(kept) : null);

async function before(
	tx: Tx,
	ctx: Context,
	row: WantRow,
	newest: Event
): Promise<Partial<WantRow>> {
	if (!(newest.what in WANT_MOVES)) return {};
	const { state, toldAt, toldBy } = newest.detail.before as Before;
	const told = { toldAt: moment(toldAt), toldBy: toldBy as TellBy | null };
	const kept = newest.what === 'yes' ? await letGo(tx, ctx, row) : {};
	return { ...kept, state, ...told };
}

/** Takes back the newest change of a want; it is an event itself. A letter that left is not called back by it. */
export const undoWant = (ctx: Context, ref: string, eventId: number): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref, 'lock');
		const newest = await newestEvent(tx, ctx, row);
		if (newest.id !== eventId)
			throw new Refused(
				'changed',
				'Something else was done with this want since. Look at its history.'
			);
		if (!mayUndo(newest.what) || ctx.now.getTime() - newest.at.getTime() > UNDO_DAYS * 86_400_000)
			throw new Refused('gate', `${happened(newest)}: this stays as it is. Change it by hand.`);
		await unsee(tx, ctx, row, newest);
		const detail = { undone: newest.id, said: happened(newest) };
		return changeWant(tx, ctx, row, 'undo', await before(tx, ctx, row, newest), detail);
	});
