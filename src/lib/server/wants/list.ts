import { ERASED_SAID } from '$lib/customers/words';
import type { WantItem } from '$lib/wants/view';
import { whatSaid } from '$lib/wants/asks';
import type { Waiter } from '$lib/wants/words';
import { sql, type SQL } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { customer, letter } from '../customers/tables';
import type { Tx } from '../db';
import { allow } from '../people';
import { fresh, live } from './live';
import { want, wantMatch } from './tables';

export const SHOWN = ['open', 'quiet', 'closed'] as const;
export type Shown = (typeof SHOWN)[number];

/** The states of each list; `w` as lists name the want. */
export const STATES: Record<Shown, SQL> = {
	open: sql`w.state in ('waiting', 'told', 'said yes')`,
	quiet: sql`w.state = 'gone quiet'`,
	closed: sql`w.state in ('said no', 'got it', 'taken off')`
};

export interface ListedRow extends Record<string, unknown> {
	id: number;
	number: number;
	customerId: number | null;
	customerName: string | null;
	customerKind: 'customer' | 'neighbour shop' | null;
	job: string;
	kind: string;
	engine: string;
	measures: string;
	numbers: string[];
	state: WantItem['state'];
	mostCents: number | null;
	addedAt: string;
	toldAt: string | null;
	toldBy: WantItem['toldBy'];
	matches: number;
	fresh: number;
	letter: WantItem['letter'];
}

const count = (what: SQL) => sql`(select count(*)::int from ${wantMatch} m
	where m.shop_id = w.shop_id and m.want_id = w.id and ${what})`;

/** The columns of a want as lists show it; what is here is counted only while somebody looks out for it. */
export const listed = sql`w.id::int, w.number, w.customer_id::int as "customerId", c.name as "customerName",
	c.kind as "customerKind", w.job, w.kind, w.engine, w.measures, w.numbers, w.state, w.most_cents as "mostCents",
	w.added_at as "addedAt", w.told_at as "toldAt", w.told_by as "toldBy",
	${count(live)} as matches,
	case when w.state in ('waiting', 'told', 'said yes') and w.part_id is null then ${count(fresh)} else 0 end as fresh,
	(select l.state from ${letter} l where l.shop_id = w.shop_id and l.about = 'want' and l.about_id = w.id
		order by l.id desc limit 1) as letter`;

export const wants = sql`${want} w left join ${customer} c on c.shop_id = w.shop_id and c.id = w.customer_id`;

/** A row in words. */
export function itemOf(row: ListedRow): WantItem {
	const who: Waiter = row.customerKind ?? 'own job';
	const name = row.customerKind ? row.customerName || ERASED_SAID[row.customerKind] : row.job;
	return {
		...{
			id: row.id,
			number: row.number,
			who,
			name,
			customerId: row.customerId,
			what: whatSaid(row)
		},
		...{ state: row.state, mostCents: row.mostCents, addedAt: new Date(row.addedAt) },
		...{ toldAt: row.toldAt ? new Date(row.toldAt) : null, toldBy: row.toldBy },
		...{ matches: row.matches, fresh: row.fresh, letter: row.letter }
	};
}

const MOST = 50;

interface Asked {
	shown?: Shown;
	customer?: number;
	/** '1.12': whether it had something new, and its id: where the page before ended. */
	cursor?: string;
	limit?: number;
}

const cursorOf = (cursor: string | undefined) => {
	const found = /^([01])\.(\d{1,15})$/.exec(cursor ?? '');
	return found
		? sql`where (x.fresh > 0, x.id) < (${found[1] === '1'}, ${Number(found[2])})`
		: sql``;
};

async function rowsFor(
	tx: Tx,
	ctx: Context,
	{ shown, customer: who, cursor }: Asked,
	most: number
) {
	const { rows } = await tx.execute<ListedRow>(sql`
		select * from (
			select ${listed} from ${wants} where w.shop_id = ${ctx.shopId}
				${shown ? sql`and ${STATES[shown]}` : sql``}
				${who === undefined ? sql`` : sql`and w.customer_id = ${who}`}) x
		${cursorOf(cursor)} order by (x.fresh > 0) desc, x.id desc limit ${most + 1}`);
	return rows;
}

/** Those who wait: first where something new is here, then the newest. */
export const listWants = (
	ctx: Context,
	asked: Asked = {}
): Promise<{ items: WantItem[]; next: string | null }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const most = Math.min(Math.max(1, asked.limit ?? MOST), 100);
		const rows = await rowsFor(tx, ctx, asked, most);
		const items = rows.slice(0, most).map(itemOf);
		const last = items.at(-1);
		return {
			items,
			next: rows.length > most && last ? `${last.fresh > 0 ? 1 : 0}.${last.id}` : null
		};
	});
