import { readTag } from '$lib/codes';
import { sayEngine } from '$lib/donors/reference';
import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import type { Stray } from '$lib/walks/view';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import { findTag } from '../tags';
import { addressOf } from './acts';
import { walkRow, type PartRow } from './rows';

/** A scanned code may be the whole address that stands on the tag. */
const lastOf = (code: string) => code.trim().split('/').at(-1) ?? '';

/** The part that a code names; what is none, or has left the shop, is said in words. */
export async function strayPart(tx: Tx, ctx: Context, code: string): Promise<PartRow> {
	const typed = lastOf(code);
	const read = readTag(typed);
	const tag = 'tag' in read ? await findTag(ctx, read.tag) : null;
	if (!tag)
		throw new Refused('bad input', `Nothing here carries the tag ${typed}. Read it again.`, 'code');
	if (tag.what !== 'part')
		throw new Refused('bad input', `${tag.code} is no part. Scan the tag on the part.`, 'code');
	const [row] = await tx
		.select()
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.tag, tag.code)))
		.for('no key update');
	if (row && !['out', 'scrapped'].includes(row.state)) return row;
	const said =
		row?.state === 'out'
			? 'fitted or sold. Take it back on its page first.'
			: 'scrapped. Undo that on its page first.';
	throw new Refused('taken', `${tag.code} is in the books as ${said}`, 'code');
}

/** What a part is that lies where it does not belong, and where it does. */
export const findStray = (
	ctx: Context,
	walkId: number,
	place: number,
	code: string
): Promise<Stray> =>
	inShop(ctx, async (tx, ctx) => {
		await walkRow(tx, ctx, walkId);
		const row = await strayPart(tx, ctx, code);
		const home = await addressOf(tx, ctx, row.binId);
		const [from] = await tx
			.select()
			.from(donor)
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.donorId ?? 0)));
		return {
			...{ tag: row.tag, kindName: kind(row.kind).name, label: row.label, home },
			engine: from ? sayEngine(from) : row.engine,
			notHere: row.binId === place ? 'It belongs here.' : null
		};
	});
