import { Refused } from '$lib/refusal';
import { ANSWERS, OUTCOME_SAID, type Outcome, type WalkWhat } from '$lib/walks/words';
import type { Answer, AtPlace } from '$lib/walks/input';
import { and, asc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { record } from '../people';
import { member } from '../people/tables';
import { ACTS, nothing } from './acts';
import { ofWalk, openWalk, partOf, sayAt, stopRow, stopsOf, type StopRow } from './rows';
import { walk, walkStop } from './tables';

async function saidAlready(tx: Tx, ctx: Context, stop: StopRow): Promise<Refused> {
	const [by] = await tx
		.select({ name: member.name })
		.from(member)
		.where(and(eq(member.shopId, ctx.shopId), eq(member.id, stop.memberId ?? 0)));
	return new Refused(
		'taken',
		`${by?.name ?? 'Somebody'} answered this already: ${OUTCOME_SAID[stop.outcome!]}. Undo that first.`
	);
}

/** The last answer ends the walk. */
export async function endIfDone(tx: Tx, ctx: Context, walkId: number): Promise<void> {
	const open = await tx.$count(walkStop, and(stopsOf(ctx, walkId), isNull(walkStop.outcome)));
	if (open === 0) await tx.update(walk).set({ endedAt: ctx.now }).where(ofWalk(ctx, walkId));
}

export interface Answered {
	n: number;
	outcome: Outcome;
	note: string;
}

/** What was found at one stop; what follows for the part is done through its own verbs. */
export const answerStop = (ctx: Context, walkId: number, input: Answer): Promise<Answered> =>
	inShop(ctx, async (tx, ctx) => {
		const { what } = await openWalk(tx, ctx, walkId);
		const stop = await stopRow(tx, ctx, walkId, input.stop);
		if (stop.outcome !== null) throw await saidAlready(tx, ctx, stop);
		if (
			!ANSWERS[what].includes(input.outcome) ||
			(stop.partId === null) !== (input.outcome === 'empty')
		)
			throw new Refused('bad input', 'Say what you found in the words of this walk.', 'outcome');
		const act = ACTS[input.outcome];
		const did =
			act && stop.partId !== null
				? await act(tx, ctx, await partOf(tx, ctx, stop.partId), stop, input)
				: nothing();
		await sayAt(tx, ctx, walkId, stop.n, { outcome: input.outcome, ...did });
		if (did.eventId === null)
			await record(tx, ctx, {
				...{ about: 'walk', aboutId: walkId, what: 'answered' },
				detail: { stop: stop.n, outcome: input.outcome }
			});
		await endIfDone(tx, ctx, walkId);
		return { n: stop.n, outcome: input.outcome, note: did.note };
	});

/** What may be said of all at a place at once. */
const EACH: Partial<Record<WalkWhat, Outcome>> = {
	'put away': 'put away',
	fetch: 'found',
	count: 'found'
};

/** Everything at this place is there, or goes there. */
export const allThere = (
	ctx: Context,
	walkId: number,
	{ place }: AtPlace
): Promise<{ count: number }> =>
	inShop(ctx, async (tx, ctx) => {
		const { what } = await openWalk(tx, ctx, walkId);
		const each = EACH[what];
		if (!each) throw new Refused('bad input', 'Decide about each part by itself.');
		const here = place === 0 ? isNull(walkStop.binId) : eq(walkStop.binId, place);
		const rows = await tx
			.select({ n: walkStop.n, partId: walkStop.partId })
			.from(walkStop)
			.where(and(stopsOf(ctx, walkId), here, isNull(walkStop.outcome)))
			.orderBy(asc(walkStop.n));
		if (rows.length === 0) throw new Refused('taken', 'Everything here is answered already.');
		for (const { n, partId } of rows)
			await answerStop(ctx, walkId, { stop: n, outcome: partId === null ? 'empty' : each });
		return { count: rows.length };
	});
