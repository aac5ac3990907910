import { date } from '$lib/format';
import { and, arrayOverlaps, asc, desc, eq, inArray, ne, or, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { box, donor } from '../donors/tables';
import { getShop } from '../people';
import { event, member } from '../people/tables';
import type { PartRow } from './row';
import { part } from './tables';

/** Who brought the part into the state it is in, and when. */
async function since(tx: Tx, ctx: Context, row: PartRow) {
	const [found] = await tx
		.select({ at: event.at, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(
			and(
				eq(event.shopId, ctx.shopId),
				eq(event.about, 'part'),
				eq(event.aboutId, row.id),
				eq(event.toState, row.state),
				sql`${event.fromState} is distinct from ${event.toState}`
			)
		)
		.orderBy(desc(event.id))
		.limit(1);
	return found ?? { at: row.changedAt, by: 'the shop' };
}

const GRADE_ORDER = sql`array_position(array['clean used','good used','usable','untested','core'], ${part.grade})`;

/** The next unit on the shelf that would answer the same call: best grade first, then the oldest. */
export async function nextLike(tx: Tx, ctx: Context, row: PartRow) {
	const same = or(
		row.engineKey ? eq(part.engineKey, row.engineKey) : undefined,
		row.numberKeys.length ? arrayOverlaps(part.numberKeys, row.numberKeys) : undefined
	);
	if (!same) return null;
	const [found] = await tx
		.select({
			id: part.id,
			tag: part.tag,
			place: sql<string | null>`coalesce(${bin.address}, 'the box of D' || ${donor.number})`
		})
		.from(part)
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)))
		.leftJoin(box, and(eq(box.shopId, part.shopId), eq(box.id, part.boxId)))
		.leftJoin(donor, and(eq(donor.shopId, box.shopId), eq(donor.id, box.donorId)))
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				eq(part.kind, row.kind),
				ne(part.id, row.id),
				inArray(part.state, ['pulled', 'shelved']),
				same
			)
		)
		.orderBy(asc(GRADE_ORDER), asc(part.pulledAt), asc(part.id))
		.limit(1);
	return found ?? null;
}

/** Where a part that cannot be had went: by whom, since when, and the next one like it. */
export async function takenWords(tx: Tx, ctx: Context, row: PartRow): Promise<string> {
	const { at, by } = await since(tx, ctx, row);
	const { timeZone } = await getShop(ctx);
	const next = await nextLike(tx, ctx, row);
	const day = (moment: Date) => date(moment, timeZone);
	const who = `by ${by} since ${day(at)}`;
	const said: Partial<Record<PartRow['state'], string>> = {
		held: `Held for ${row.heldFor} until ${row.heldUntil ? day(row.heldUntil) : 'further notice'}, ${who}.`,
		out: `${row.outAs === 'sold' ? 'Sold' : 'Fitted'}${row.outTo ? ` ${row.outAs === 'sold' ? 'to' : 'on'} ${row.outTo}` : ''} by ${by} on ${day(at)}.`,
		scrapped: `${row.destroyed ? 'Destroyed' : 'Scrapped'} by ${by} on ${day(at)}: ${row.scrapReason}.`,
		missing: `Missing, reported ${who}.`,
		pulled: `Not held for anybody, ${who}.`,
		shelved: `On the shelf, put there ${who}.`
	};
	const like = next ? ` Next like it: ${next.tag}${next.place ? ` in ${next.place}` : ''}.` : '';
	return `${said[row.state] ?? `In the red bin, ${who}.`}${like}`;
}
