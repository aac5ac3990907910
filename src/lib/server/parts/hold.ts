import type { Hold } from '$lib/parts/input';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, getShop } from '../people';
import { endOfDay } from './day';
import { restingState } from './missing';
import { changePart, partFor, partRow, type Done, type PartRow } from './row';

const WEEK_MS = 7 * 24 * 3600 * 1000;

/** Keeps a part for somebody until a date, a week when none is said. Of many who ask at once one gets it. */
export const holdPart = (ctx: Context, tag: string, input: Hold): Promise<Done & { until: Date }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'hold');
		await freeIfExpired(tx, ctx, await partRow(tx, ctx, tag, 'lock'));
		const row = await partFor(tx, ctx, tag, 'hold');
		const until = await holdUntil(ctx, input.until);
		const set = { state: 'held', heldFor: input.for, heldUntil: until } as const;
		return { ...(await changePart(tx, ctx, row, 'hold', set, { for: input.for })), until };
	});

async function holdUntil(ctx: Context, typed: string | undefined): Promise<Date> {
	if (!typed) return new Date(ctx.now.getTime() + WEEK_MS);
	const { timeZone } = await getShop(ctx);
	const until = typed.includes('T') ? new Date(typed) : endOfDay(typed, timeZone);
	if (until <= ctx.now) throw new Refused('bad input', 'Hold it until today or later.', 'until');
	return until;
}

/** Lets a held part go again. */
export const freePart = (ctx: Context, tag: string): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => free(tx, ctx, await partFor(tx, ctx, tag, 'free'), {}));

const free = (
	tx: Tx,
	ctx: Context,
	row: PartRow,
	detail: Record<string, unknown>
): Promise<Done> => {
	const set = { state: restingState(row), heldFor: null, heldUntil: null } as const;
	return changePart(tx, ctx, row, 'free', set, detail);
};

/** Lets go of a hold whose date is past; says whether there was one. */
export async function freeIfExpired(tx: Tx, ctx: Context, row: PartRow): Promise<boolean> {
	if (row.state !== 'held' || !row.heldUntil || row.heldUntil > ctx.now) return false;
	await free(tx, ctx, row, { expired: true });
	return true;
}
