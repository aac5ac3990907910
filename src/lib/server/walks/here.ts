import type { Here } from '$lib/walks/input';
import { and, desc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { foundPart, movePart } from '../parts';
import { addressOf } from './acts';
import { answerStop, endIfDone } from './answer';
import { openWalk, sayAt, stopsOf, type PartRow } from './rows';
import { strayPart } from './stray';
import { walkStop } from './tables';

/** Its own stop on this walk, if it waits to be answered. */
async function openStop(tx: Tx, ctx: Context, walkId: number, partId: number) {
	const [row] = await tx
		.select()
		.from(walkStop)
		.where(and(stopsOf(ctx, walkId), eq(walkStop.partId, partId), isNull(walkStop.outcome)));
	return row ?? null;
}

async function addStop(tx: Tx, ctx: Context, walkId: number, row: PartRow, place: number) {
	const [last] = await tx
		.select({ n: walkStop.n })
		.from(walkStop)
		.where(stopsOf(ctx, walkId))
		.orderBy(desc(walkStop.n))
		.limit(1);
	const n = (last?.n ?? 0) + 1;
	const { shopId, memberId, now: at } = ctx;
	await tx.insert(walkStop).values({
		...{ shopId, walkId, n, binId: place || null, partId: row.id, why: 'turned up' },
		...{ outcome: 'moved here', memberId, at }
	});
	return n;
}

/** Moves it, or finds it again; a part that lies where the books say needs neither. */
async function putRight(ctx: Context, row: PartRow, here: string | null, home: string | null) {
	if (here && here !== home) {
		const done = await movePart(ctx, row.tag, { bin: here });
		return { eventId: done.eventId, note: `moved to ${done.to}` };
	}
	const back = row.state === 'missing' ? (await foundPart(ctx, row.tag)).eventId : null;
	return { eventId: back, note: home ? `back to ${home}` : 'put by' };
}

/**
 * A part turned up where it does not belong: from now on it lies here, or it is carried back to its bin.
 * Its own stop, if this walk has one, is answered with it.
 */
export const putStrayRight = (
	ctx: Context,
	walkId: number,
	input: Here
): Promise<{ tag: string; note: string; n: number }> =>
	inShop(ctx, async (tx, ctx) => {
		await openWalk(tx, ctx, walkId);
		const row = await strayPart(tx, ctx, input.code);
		const own = await openStop(tx, ctx, walkId, row.id);
		if (own && own.binId === (input.place || null)) {
			const { note } = await answerStop(ctx, walkId, { stop: own.n, outcome: 'found' });
			return { tag: row.tag, note: note || 'it belongs here', n: own.n };
		}
		const home = await addressOf(tx, ctx, row.binId);
		const here = input.then === 'here' ? await addressOf(tx, ctx, input.place || null) : null;
		const did = await putRight(ctx, row, here, home);
		const n = own?.n ?? (await addStop(tx, ctx, walkId, row, input.place));
		await sayAt(tx, ctx, walkId, n, { outcome: 'moved here', ...did });
		await endIfDone(tx, ctx, walkId);
		return { tag: row.tag, note: did.note, n };
	});
