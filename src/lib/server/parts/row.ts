import { readTag } from '$lib/codes';
import { comesIn } from '$lib/parts/coming';
import { searchWords } from '$lib/parts/search-words';
import { isMove, leads, NEEDS, whyNot, type Move, type PartFacts } from '$lib/parts/state';
import type { PartState } from '$lib/parts/words';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { notToLeave } from '../donors';
import { allow, record } from '../people';
import { announcePart } from './announce';
import { isDoubtful } from './doubt';
import { part } from './tables';
import { takenWords } from './taken';

const LEAVING: readonly Move[] = ['sell', 'fit', 'scrap'];

export type PartRow = typeof part.$inferSelect;

/** What a verb says when it is done: which part, and the event that can be undone. */
export interface Done {
	tag: string;
	eventId: number;
}

export const own = (ctx: Context, id: number) => and(eq(part.shopId, ctx.shopId), eq(part.id, id));

/** The row of a tag, locked when it is about to change. */
export async function partRow(
	tx: Tx,
	ctx: Context,
	typed: string,
	lock: 'lock' | 'look' = 'look'
): Promise<PartRow> {
	const reading = readTag(typed);
	if (!('tag' in reading)) throw new NotFound();
	const query = tx
		.select()
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.tag, reading.tag)));
	const [row] = await (lock === 'lock' ? query.for('no key update') : query);
	if (!row) throw new NotFound();
	return row;
}

export async function factsOf(tx: Tx, ctx: Context, row: PartRow): Promise<PartFacts> {
	return { state: row.state, kind: row.kind, doubtful: await isDoubtful(tx, ctx, row.id) };
}

/** Asks whether the member may, locks the part and asks the rules; a shut move is refused with by whom and since when, or what opens it. */
export async function partFor(tx: Tx, ctx: Context, tag: string, move: Move): Promise<PartRow> {
	allow(ctx, NEEDS[move]);
	const row = await partRow(tx, ctx, tag, 'lock');
	const no = whyNot(move, await factsOf(tx, ctx, row));
	if (!no) return released(tx, ctx, row, move);
	throw new Refused(no.code, no.code === 'taken' ? await takenWords(tx, ctx, row) : no.said);
}

/** What leaves the shop needs the release of its donor to stand, and its hold date to be past. */
async function released(tx: Tx, ctx: Context, row: PartRow, move: Move): Promise<PartRow> {
	if (row.donorId === null || !LEAVING.includes(move)) return row;
	const said = await notToLeave(tx, ctx, row.donorId);
	if (said) throw new Refused('gate', said);
	return row;
}

const WORDED = ['label', 'numbers', 'note', 'engine', 'set'] as const;

/**
 * Writes a change of a part with its event; `detail` also keeps what stood there before, for undoing.
 * One conditional UPDATE: of two who saw the same part, one changes it.
 */
export async function changePart(
	tx: Tx,
	ctx: Context,
	row: PartRow,
	what: Move | 'undo',
	set: Partial<PartRow>,
	detail: Record<string, unknown> = {}
): Promise<Done> {
	const next = { ...row, ...set };
	if (isMove(what) && !leads(what, row.state, next.state))
		throw new Error(`${what} cannot lead from ${row.state} to ${next.state}`);
	const [changed] = await tx
		.update(part)
		.set({
			...set,
			...(WORDED.some((key) => key in set) ? { searchWords: searchWords(next) } : {}),
			version: row.version + 1,
			changedAt: ctx.now
		})
		.where(and(own(ctx, row.id), eq(part.state, row.state), eq(part.version, row.version)))
		.returning({ id: part.id });
	if (!changed) throw new Refused('taken', await takenWords(tx, ctx, row));
	const before = Object.fromEntries(
		Object.keys(set).map((key) => [key, row[key as keyof PartRow]])
	);
	const eventId = await recordPart(tx, ctx, row, what, next.state, { ...detail, before });
	const isNew = comesIn(row.state, next.state);
	if (isNew || WORDED.some((key) => key in set)) await announcePart(tx, ctx, row.id, isNew);
	return { tag: row.tag, eventId };
}

/** Writes an event of a part; the states are always said, so that the replay is the state. */
export const recordPart = (
	tx: Tx,
	ctx: Context,
	row: { id: number; state: PartState | null },
	what: string,
	toState: PartState,
	detail: Record<string, unknown>
): Promise<number> =>
	record(tx, ctx, {
		about: 'part',
		aboutId: row.id,
		what,
		fromState: row.state,
		toState,
		detail
	});
