import { Refused } from '$lib/refusal';
import type { Stop } from '$lib/walks/input';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { undoPart } from '../parts';
import { allow, record } from '../people';
import { ofWalk, sayAt, stopRow, stopsOf, walkRow } from './rows';
import { walk, walkStop } from './tables';

/** Takes back what was said at a stop, and what it did to the part; the stop is open again. */
export const takeBackAnswer = (ctx: Context, walkId: number, input: Stop): Promise<Stop> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		await walkRow(tx, ctx, walkId, 'lock');
		const stop = await stopRow(tx, ctx, walkId, input.stop);
		if (stop.outcome === null) throw new Refused('taken', 'Nothing was said here yet.');
		if (stop.eventId !== null) await undoPart(ctx, stop.eventId);
		if (stop.why === 'turned up')
			await tx.delete(walkStop).where(and(stopsOf(ctx, walkId), eq(walkStop.n, stop.n)));
		else {
			await sayAt(tx, ctx, walkId, stop.n, { outcome: null, note: '', eventId: null });
			await tx.update(walk).set({ endedAt: null }).where(ofWalk(ctx, walkId));
		}
		if (stop.eventId === null)
			await record(tx, ctx, {
				...{ about: 'walk', aboutId: walkId, what: 'undone' },
				detail: { stop: stop.n, outcome: stop.outcome }
			});
		return { stop: stop.n };
	});

/** Leaves a walk where it is; what was not reached stays as it was. */
export const endWalk = (ctx: Context, walkId: number): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await walkRow(tx, ctx, walkId, 'lock');
		if (row.endedAt) throw new Refused('taken', 'This walk is over already.');
		await tx.update(walk).set({ endedAt: ctx.now }).where(ofWalk(ctx, walkId));
		const states = { fromState: 'open', toState: 'over' };
		await record(tx, ctx, { about: 'walk', aboutId: walkId, what: 'ended', ...states });
		return { id: walkId };
	});

/** Goes on with a walk that was left. */
export const reopenWalk = (ctx: Context, walkId: number): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await walkRow(tx, ctx, walkId, 'lock');
		if (!row.endedAt) throw new Refused('taken', 'This walk still goes on.');
		await tx.update(walk).set({ endedAt: null }).where(ofWalk(ctx, walkId));
		const states = { fromState: 'over', toState: 'open' };
		await record(tx, ctx, { about: 'walk', aboutId: walkId, what: 'went on', ...states });
		return { id: walkId };
	});
