import type { DonorState } from '$lib/donors/words';
import { UNDO_DAYS } from '$lib/parts/history';
import { Refused } from '$lib/refusal';
import { and, desc, eq, isNotNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { event } from '../people/tables';
import { donorParts } from './parts-of';
import { donorRow } from './rows';
import { donor } from './tables';
import { writeMove } from './write-move';

async function findMove(tx: Tx, ctx: Context, eventId: number) {
	const [found] = await tx
		.select({ from: event.fromState, what: event.what, at: event.at, number: donor.number })
		.from(event)
		.innerJoin(donor, and(eq(donor.shopId, event.shopId), eq(donor.id, event.aboutId)))
		.where(
			and(
				eq(event.shopId, ctx.shopId),
				eq(event.id, eventId),
				eq(event.about, 'donor'),
				isNotNull(event.fromState),
				isNotNull(event.toState)
			)
		);
	return found;
}

async function newestMove(tx: Tx, ctx: Context, donorId: number): Promise<number | undefined> {
	const [newest] = await tx
		.select({ id: event.id })
		.from(event)
		.where(
			and(
				eq(event.shopId, ctx.shopId),
				eq(event.about, 'donor'),
				eq(event.aboutId, donorId),
				isNotNull(event.toState)
			)
		)
		.orderBy(desc(event.id))
		.limit(1);
	return newest?.id;
}

/** Takes back the newest step of a donor; says whether the event was one. What left is brought back, not undone. */
export const undoDonorMove = (ctx: Context, eventId: number): Promise<boolean> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const move = await findMove(tx, ctx, eventId);
		if (!move) return false;
		const row = await donorRow(tx, ctx, `D${move.number}`, { lock: true });
		const to = move.from as DonorState;
		const old = ctx.now.getTime() - move.at.getTime() > UNDO_DAYS * 86_400_000;
		if (old || row.state === 'gone' || (await newestMove(tx, ctx, row.id)) !== eventId)
			throw new Refused('changed', `D${row.number} has gone on since. Look at it first.`);
		if (to === 'whole' && (await donorParts(tx, ctx, row.id)).length > 0)
			throw new Refused('gate', `Parts have come off D${row.number}: it is not whole any more.`);
		const strippedAt = to === 'stripped' ? ctx.now : null;
		await writeMove(tx, ctx, row, {
			...{ to, what: `took back: ${move.what}`, set: { strippedAt }, detail: {} }
		});
		return true;
	});
