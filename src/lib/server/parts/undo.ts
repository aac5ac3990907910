import { happened, mayUndo, UNDO_DAYS } from '$lib/parts/history';
import { isMove, MISTAKE, NEEDS, undone } from '$lib/parts/state';
import type { PartState } from '$lib/parts/words';
import { NotFound, Refused } from '$lib/refusal';
import { and, desc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { event } from '../people/tables';
import { pinsGoBack } from './pins-follow';
import { changePart, own, type Done, type PartRow } from './row';
import { part } from './tables';

type Event = typeof event.$inferSelect;

/** Takes back the newest change of a part; it is an event itself, nothing is wiped out. */
export const undoPart = (ctx: Context, eventId: number): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const about = await partEvent(tx, ctx, eq(event.id, eventId));
		const [row] = await tx.select().from(part).where(own(ctx, about.aboutId)).for('no key update');
		if (!row) throw new NotFound();
		const newest = await partEvent(tx, ctx, eq(event.aboutId, row.id));
		if (newest.id !== eventId)
			throw new Refused(
				'changed',
				'Something else was done with this part since. Look at its history.'
			);
		if (!mayUndo(newest.what))
			throw new Refused('gate', `${happened(newest)}: this stays in the history.`);
		if (isMove(newest.what)) allow(ctx, NEEDS[newest.what]);
		if (ctx.now.getTime() - newest.at.getTime() > UNDO_DAYS * 24 * 3600 * 1000)
			throw new Refused('gate', `This was more than ${UNDO_DAYS} days ago. Change it by hand.`);
		if (newest.fromState === null) await pinsGoBack(tx, ctx, row.id);
		const detail = { undone: newest.id, said: happened(newest) };
		return changePart(tx, ctx, row, 'undo', before(newest), detail);
	});

async function partEvent(tx: Tx, ctx: Context, which: ReturnType<typeof eq>): Promise<Event> {
	const [found] = await tx
		.select()
		.from(event)
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'part'), which))
		.orderBy(desc(event.id))
		.limit(1);
	if (!found) throw new NotFound();
	return found;
}

/** What stood there before; of a part that was only just logged, that it was a mistake. */
function before(newest: Event): Partial<PartRow> {
	const state = undone(newest.fromState as PartState | null);
	if (newest.fromState === null) return { state, scrapReason: MISTAKE, binId: null, boxId: null };
	const kept = newest.detail.before as Partial<PartRow>;
	return { ...kept, ...('heldUntil' in kept ? { heldUntil: moment(kept.heldUntil) } : {}), state };
}

const moment = (kept: unknown) => (typeof kept === 'string' ? new Date(kept) : null);
