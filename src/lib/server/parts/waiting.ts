import type { Queued } from '$lib/parts/place';
import { waiterSaid, waitsFor, type OpenWant, type Wantable } from '$lib/parts/wanted';
import { sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import { customer } from '../customers/tables';
import type { Tx } from '../db';
import { want, wantMatch } from '../wants/tables';
import { part } from './tables';

/** What a want may ask for. */
export interface Asked {
	kind: string;
	numberKeys: readonly string[];
}

type Row = Record<string, unknown> &
	Omit<OpenWant, 'answered'> & { answered: { id: number; grade: never; pulledAt: number }[] };

const list = (values: readonly string[]) => sql`${sql.param([...values])}::text[]`;

/** Parts that answer a want and stand in the shop, promised to nobody. */
const answered = sql`(
	select coalesce(json_agg(json_build_object('id', p.id, 'grade', p.grade,
		'pulledAt', (extract(epoch from p.pulled_at) * 1000)::bigint)), '[]')
	from ${wantMatch} m join ${part} p on p.shop_id = m.shop_id and p.id = m.part_id
		left join ${bin} b on b.shop_id = p.shop_id and b.id = p.bin_id
	where m.shop_id = w.shop_id and m.want_id = w.id and m.dropped_at is null
		and p.state in ('pulled', 'shelved') and b.red is distinct from true)`;

const not = sql`(
	select coalesce(json_agg(m.part_id), '[]') from ${wantMatch} m
	where m.shop_id = w.shop_id and m.want_id = w.id and m.dropped_at is not null
		and m.part_id is not null)`;

/** The wants still open that may be answered by one of these kinds or numbers: one query, by the index of open ones. */
export async function openWants(
	tx: Tx,
	ctx: Context,
	asked: readonly Asked[]
): Promise<OpenWant[]> {
	if (asked.length === 0) return [];
	const kinds = [...new Set(asked.map(({ kind }) => kind))];
	const keys = [...new Set(asked.flatMap(({ numberKeys }) => numberKeys))];
	const { rows } = await tx.execute<Row>(sql`
		select w.id::int, w.number, w.job, w.kind, w.engine, w.measures, w.number_keys as "numberKeys",
			coalesce(c.kind, 'own job') as who, ${answered} as answered, ${not} as not
		from ${want} w left join ${customer} c on c.shop_id = w.shop_id and c.id = w.customer_id
		where w.shop_id = ${ctx.shopId} and w.state in ('waiting', 'told', 'said yes') and w.part_id is null
			and (w.kind = any(${list(kinds)}) or (w.kind = '' and w.number_keys && ${list(keys)}))
		order by w.number`);
	return rows;
}

/** Who waits for this, as a verdict names them. */
export function waitingOf(
	thing: Queued & Wantable,
	open: readonly OpenWant[]
): { waiting: boolean; waitingFor: string | null } {
	const want = waitsFor(thing, open);
	return { waiting: want !== null, waitingFor: want && waiterSaid(want) };
}
