import { canMove, WANT_MOVES, wantNumber, type WantMove } from '$lib/wants/state';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { want } from './tables';

export type WantRow = typeof want.$inferSelect;

/** What a verb says when it is done: which want, and the event that can be undone. */
export interface Done {
	number: number;
	eventId: number;
}

export const ownWant = (ctx: Context, id: number) =>
	and(eq(want.shopId, ctx.shopId), eq(want.id, id));

/** The want of a number, W12, locked when it is about to change. */
export async function wantRow(
	tx: Tx,
	ctx: Context,
	ref: string,
	lock: 'lock' | 'look' = 'look'
): Promise<WantRow> {
	const number = wantNumber(ref);
	if (number === null) throw new NotFound();
	const query = tx
		.select()
		.from(want)
		.where(and(eq(want.shopId, ctx.shopId), eq(want.number, number)));
	const [row] = await (lock === 'lock' ? query.for('no key update') : query);
	if (!row) throw new NotFound();
	return row;
}

/** Asks whether the member may, locks the want and asks the rule. */
export async function wantFor(tx: Tx, ctx: Context, ref: string, move: WantMove): Promise<WantRow> {
	allow(ctx, 'trade');
	const row = await wantRow(tx, ctx, ref, 'lock');
	if (canMove(move, row.state)) return row;
	throw new Refused(
		'gate',
		`W${row.number} is “${row.state}” by now. Look at it again${canMove('wait on', row.state) ? ', or let it wait on first' : ''}.`
	);
}

/** Writes a change of a want with its event; `before` keeps what stood there, for undoing. */
export async function changeWant(
	tx: Tx,
	ctx: Context,
	row: WantRow,
	what: WantMove | 'undo' | 'edited' | 'hold ended' | 'erased',
	set: Partial<WantRow>,
	detail: Record<string, unknown> = {}
): Promise<Done> {
	const state = what in WANT_MOVES ? WANT_MOVES[what as WantMove].to : (set.state ?? row.state);
	await tx
		.update(want)
		.set({ ...set, state, version: row.version + 1, changedAt: ctx.now })
		.where(ownWant(ctx, row.id));
	const { toldAt, toldBy } = row;
	const eventId = await record(tx, ctx, {
		about: 'want',
		aboutId: row.id,
		what,
		fromState: row.state,
		toState: state,
		detail: { ...detail, before: { state: row.state, toldAt, toldBy } }
	});
	return { number: row.number, eventId };
}
