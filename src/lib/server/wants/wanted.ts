import { ERASED_SAID } from '$lib/customers/words';
import { may } from '$lib/people/role';
import { whatSaid } from '$lib/wants/asks';
import { wantSaid } from '$lib/wants/state';
import type { WantedBy } from '$lib/wants/view';
import { sql, type SQL } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import { wants, type ListedRow } from './list';
import { live } from './live';
import { wantMatch } from './tables';

async function asked(tx: Tx, ctx: Context, which: SQL): Promise<ListedRow[]> {
	const { rows } = await tx.execute<ListedRow>(sql`
		select w.number, w.job, w.kind, w.engine, w.measures, w.numbers, c.name as "customerName", c.kind as "customerKind"
		from ${wants} where w.shop_id = ${ctx.shopId} and w.state in ('waiting', 'told', 'said yes')
			and w.part_id is null
			and exists (select from ${wantMatch} m where m.shop_id = w.shop_id and m.want_id = w.id and ${live} and ${which})
		order by w.number limit 20`);
	return rows;
}

/** The bench is told that somebody waits and for what; who it is stays at the counter. */
function wantedBy(ctx: Context, row: ListedRow): WantedBy {
	const isOpenTo = may(ctx.role, 'trade');
	const person = row.customerKind && ERASED_SAID[row.customerKind];
	const said = person ? (isOpenTo && row.customerName) || person : row.job;
	return {
		number: row.number,
		said: `${said} (${wantSaid(row.number)})`,
		what: whatSaid(row),
		isOpenTo
	};
}

/** Who waits for this part. */
export const partWanted = (ctx: Context, partId: number): Promise<WantedBy[]> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await asked(
			tx,
			ctx,
			sql`m.part_id = (select p.id from ${part} p
			where p.shop_id = ${ctx.shopId} and p.id = ${partId})`
		);
		return rows.map((row) => wantedBy(ctx, row));
	});

/** Who waits for something that is still on this donor. */
export const donorWanted = (ctx: Context, donorId: number): Promise<WantedBy[]> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await asked(
			tx,
			ctx,
			sql`m.donor_id = (select d.id from ${donor} d
			where d.shop_id = ${ctx.shopId} and d.id = ${donorId})`
		);
		return rows.map((row) => wantedBy(ctx, row));
	});
