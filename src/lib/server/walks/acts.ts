import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import type { Answer } from '$lib/walks/input';
import type { Outcome } from '$lib/walks/words';
import { and, eq } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { editPart, foundPart, missPart, movePart, scrapPart } from '../parts';
import type { PartRow, StopRow } from './rows';

/** What an answer did to the part: the event to undo it by, and words for the list. */
export interface Did {
	eventId: number | null;
	note: string;
}
export const nothing = (note = ''): Did => ({ eventId: null, note });

export async function addressOf(
	tx: Tx,
	ctx: Context,
	binId: number | null
): Promise<string | null> {
	if (binId === null) return null;
	const [row] = await tx
		.select({ address: bin.address })
		.from(bin)
		.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, binId)));
	return row?.address ?? null;
}

async function moved(ctx: Context, row: PartRow, to: string | null): Promise<Did> {
	if (!to) throw new Refused('bad input', 'Say which bin it goes to.', 'bin');
	const done = await movePart(ctx, row.tag, { bin: to });
	return { eventId: done.eventId, note: `in ${done.to}` };
}

const PRICE_DOWN = 'Price down: nobody called for it, offer it for less.';

type Act = (tx: Tx, ctx: Context, part: PartRow, stop: StopRow, input: Answer) => Promise<Did>;

const left = (part: PartRow) => part.state === 'out' || part.state === 'scrapped';
const GONE = 'It left the shop meanwhile: ';

export const ACTS: Partial<Record<Outcome, Act>> = {
	found: async (tx, ctx, part, stop) => {
		if (left(part)) throw new Refused('taken', `${GONE}look at its page before you lay it back.`);
		const here = await addressOf(tx, ctx, stop.binId);
		if (stop.binId !== part.binId && here) return moved(ctx, part, here);
		if (part.state !== 'missing') return nothing();
		return { eventId: (await foundPart(ctx, part.tag)).eventId, note: 'turned up again' };
	},
	'not there': async (_tx, ctx, part) => {
		if (left(part))
			return nothing(part.state === 'out' ? 'fitted or sold meanwhile' : 'scrapped meanwhile');
		if (part.state === 'missing') return nothing('still missing');
		return { eventId: (await missPart(ctx, part.tag)).eventId, note: '' };
	},
	'put away': async (tx, ctx, part, stop, { bin: typed }) =>
		moved(ctx, part, typed ?? (await addressOf(tx, ctx, stop.binId))),
	scrapped: async (_tx, ctx, part, stop) => {
		const destroyed = kind(part.kind).reuse.startsWith('safety');
		const done = await scrapPart(ctx, part.tag, { reason: `purge: ${stop.why}`, destroyed });
		return { eventId: done.eventId, note: destroyed ? 'to be destroyed' : '' };
	},
	'price down': async (_tx, ctx, part) => {
		const note = [PRICE_DOWN, part.note.replace(PRICE_DOWN, '').trim()].filter(Boolean).join('\n');
		const done = await editPart(ctx, part.tag, { version: part.version, note });
		return { eventId: done.eventId, note: '' };
	}
};
