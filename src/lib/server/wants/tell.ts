import type { TellInput } from '$lib/wants/input';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { customerRow, writeLetter } from '../customers';
import type { Tx } from '../db';
import { liveMatches, type LiveMatch } from './matches';
import { changeWant, wantFor, type Done, type WantRow } from './rows';
import { wantMatch } from './tables';
import { letterFor } from './values';

/** What they are told of: the one that was chosen, or the best that is here. */
async function toldOf(tx: Tx, ctx: Context, row: WantRow, id: number | undefined) {
	const all = await liveMatches(tx, ctx, row);
	const chosen = id === undefined ? all[0] : all.find((one) => one.id === id);
	if (id !== undefined && !chosen) throw new NotFound();
	return chosen ?? null;
}

/** Whoever told them has looked at all that is here. */
export const markSeen = (tx: Tx, ctx: Context, row: WantRow) =>
	tx
		.update(wantMatch)
		.set({ seenAt: ctx.now })
		.where(
			and(eq(wantMatch.shopId, ctx.shopId), eq(wantMatch.wantId, row.id), isNull(wantMatch.seenAt))
		);

async function byLetter(tx: Tx, ctx: Context, row: WantRow, match: LiveMatch | null) {
	const who = row.customerId === null ? null : await customerRow(tx, ctx, row.customerId);
	if (!who?.email)
		throw new Refused(
			'gate',
			'There is no e-mail address of them. Tell them another way, or add it.',
			'by'
		);
	if (who.lettersOffAt)
		throw new Refused('gate', `${who.name} wants no letters. Tell them another way.`, 'by');
	if (!match) throw new Refused('gate', 'Nothing is here for them to be told of by letter.', 'by');
	const letter = await letterFor(tx, ctx, row, who, match);
	await writeLetter(tx, ctx, { ...letter, to: who, about: 'want', aboutId: row.id });
}

/**
 * Those who wait are told: by a letter that leaves with this change and only with it, or by what somebody at the
 * counter did. How the letter fares is seen on the list.
 */
export const tellWant = (
	ctx: Context,
	ref: string,
	input: TellInput & { byItself?: boolean }
): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await wantFor(tx, ctx, ref, 'tell');
		const match = await toldOf(tx, ctx, row, input.match);
		if (input.by === 'e-mail') await byLetter(tx, ctx, row, match);
		await markSeen(tx, ctx, row);
		const set = { toldAt: ctx.now, toldBy: input.by };
		const of = match?.part?.tag ?? match?.donor?.number;
		const detail = {
			by: input.by,
			...(of ? { of } : {}),
			...(input.byItself ? { byItself: true } : {})
		};
		return changeWant(tx, ctx, row, 'tell', set, detail);
	});
