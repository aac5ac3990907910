import { happened, mayUndo } from '$lib/wants/history';
import { wantSaid } from '$lib/wants/state';
import type { MatchView, WantView } from '$lib/wants/view';
import { and, desc, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { customer } from '../customers/tables';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { allow } from '../people';
import { event, member } from '../people/tables';
import { itemOf, listed, wants, type ListedRow } from './list';
import { liveMatches, type LiveMatch } from './matches';
import { wantRow, type WantRow } from './rows';

async function historyOf(tx: Tx, ctx: Context, row: WantRow): Promise<WantView['history']> {
	const rows = await tx
		.select({ event, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'want'), eq(event.aboutId, row.id)))
		.orderBy(desc(event.id));
	return rows.map(({ event: one, by }, place) => ({
		...{ id: one.id, at: one.at, by, said: happened(one) },
		undo: place === 0 && mayUndo(one.what)
	}));
}

const viewOf = ({ id, rank, at, isNew, part, donor }: LiveMatch): MatchView => ({
	...{ id, rank, at, isNew },
	part: part && {
		...{ tag: part.tag, kindName: part.kindName, engine: part.engine, grade: part.grade },
		...{ state: part.state, bin: part.bin, askedCents: part.askedCents, heldBy: part.heldBy }
	},
	donor: donor && {
		...{ number: donor.number, engine: donor.engine, state: donor.state, minutes: donor.minutes }
	}
});

async function reachOf(tx: Tx, ctx: Context, row: WantRow) {
	const nobody = { phone: '', email: '', lettersOff: false };
	if (row.customerId === null) return nobody;
	const [who] = await tx
		.select({ phone: customer.phone, email: customer.email, off: customer.lettersOffAt })
		.from(customer)
		.where(and(eq(customer.shopId, ctx.shopId), eq(customer.id, row.customerId)));
	return who ? { phone: who.phone, email: who.email, lettersOff: who.off !== null } : nobody;
}

async function keptOf(tx: Tx, ctx: Context, { partId }: WantRow) {
	if (partId === null) return null;
	const [kept] = await tx
		.select({ tag: part.tag })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.id, partId)));
	return kept?.tag ?? null;
}

/** One want with who waits, what is here for it, and what happened to it. */
export const getWant = (ctx: Context, ref: string): Promise<WantView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const row = await wantRow(tx, ctx, ref);
		const { rows } = await tx.execute<ListedRow>(
			sql`select ${listed} from ${wants} where w.shop_id = ${ctx.shopId} and w.id = ${row.id}`
		);
		const [by] = await tx
			.select({ name: member.name })
			.from(member)
			.where(and(eq(member.shopId, ctx.shopId), eq(member.id, row.memberId)));
		return {
			...itemOf(rows[0]!),
			...{ kind: row.kind, engine: row.engine, measures: row.measures, numbers: row.numbers },
			...{ note: row.note, tellBy: row.tellBy, version: row.version, by: by?.name ?? '' },
			...(await reachOf(tx, ctx, row)),
			kept: await keptOf(tx, ctx, row),
			found: (await liveMatches(tx, ctx, row)).map(viewOf),
			history: await historyOf(tx, ctx, row)
		};
	});

/** Where a want stands after a change: nothing of a person, as answers of changes are kept. */
export const wantState = (ctx: Context, ref: string) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const { number, state, version } = await wantRow(tx, ctx, ref);
		return { number: wantSaid(number), state, version };
	});
