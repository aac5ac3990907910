import type { FitRank } from '$lib/parts/wanted';
import type { PartItem } from '$lib/parts/view';
import { sayEngine, sayNumber } from '$lib/donors/reference';
import { MISTAKE } from '$lib/parts/state';
import { minutesToPull } from '$lib/trade';
import { and, eq, inArray, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { partsByIds } from '../parts';
import { part } from '../parts/tables';
import { live, matches } from './live';
import type { WantRow } from './rows';
import { kindsThere } from './things';

interface Row extends Record<string, unknown> {
	id: number;
	rank: FitRank;
	at: string;
	isNew: boolean;
	partId: number | null;
	donorId: number | null;
}

export interface LiveMatch {
	id: number;
	rank: FitRank;
	at: Date;
	isNew: boolean;
	part: PartItem | null;
	donor: { id: number; number: string; engine: string; state: string; minutes: number } | null;
}

const logged = sql<
	string[]
>`array(select distinct p.kind from ${part} p where p.shop_id = ${donor.shopId}
	and p.donor_id = ${donor.id} and p.scrap_reason is distinct from ${MISTAKE})`;

/** Donors that carry a kind, with the minutes it takes to pull it. */
async function donorsOf(tx: Tx, ctx: Context, ids: number[], kind: string) {
	if (ids.length === 0) return new Map<number, LiveMatch['donor']>();
	const { id, number, maker, model, state, engineClass, fittings } = donor;
	const rows = await tx
		.select({ id, number, maker, model, state, engineClass, fittings, logged })
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), inArray(donor.id, ids)));
	return new Map(
		rows.map((row) => [
			row.id,
			{
				...{ id: row.id, number: sayNumber(row.number), engine: sayEngine(row), state: row.state },
				minutes: minutesToPull(kind, kindsThere(row))
			}
		])
	);
}

/** What is here for a want and still to be had: the best fit first, parts before donors, the newest first. */
export async function liveMatches(tx: Tx, ctx: Context, row: WantRow): Promise<LiveMatch[]> {
	const { rows } = await tx.execute<Row>(sql`
		select m.id::int, m.rank::int, m.at, m.seen_at is null as "isNew", m.part_id::int as "partId", m.donor_id::int as "donorId"
		from ${matches} where m.shop_id = ${ctx.shopId} and m.want_id = ${row.id} and ${live}
		order by m.rank, m.part_id is null, m.at desc, m.id desc limit 40`);
	const partIds = rows.flatMap(({ partId }) => partId ?? []);
	const donorIds = rows.flatMap(({ donorId }) => donorId ?? []);
	const parts = new Map((await partsByIds(ctx, partIds)).map((item) => [item.id, item]));
	const donors = await donorsOf(tx, ctx, donorIds, row.kind);
	return rows
		.map(({ id, rank, at, isNew, partId, donorId }) => ({
			...{ id, rank, at: new Date(at), isNew },
			part: (partId && parts.get(partId)) || null,
			donor: (donorId && donors.get(donorId)) || null
		}))
		.filter((one) => one.part !== null || one.donor !== null);
}
