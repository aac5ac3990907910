import { sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { SHOWN, STATES, type Shown } from './list';
import { fresh, matches } from './live';
import { want } from './tables';

interface Counts extends Record<string, unknown> {
	open: number;
	quiet: number;
	closed: number;
}

/** How many wants stand on each list. */
export const countWants = (ctx: Context): Promise<Record<Shown, number>> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const { rows } = await tx.execute<Counts>(sql`
			select ${sql.join(
				SHOWN.map(
					(shown) => sql`count(*) filter (where ${STATES[shown]})::int as ${sql.identifier(shown)}`
				),
				sql`, `
			)} from ${want} w where w.shop_id = ${ctx.shopId}`);
		return rows[0]!;
	});

/** For how many who wait something is here that nobody at the counter has looked at. */
export const countFresh = (ctx: Context): Promise<number> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const { rows } = await tx.execute<{ count: number }>(sql`
			select count(distinct w.id)::int as count from ${matches}
			where m.shop_id = ${ctx.shopId} and w.state in ('waiting', 'told', 'said yes') and w.part_id is null
				and ${fresh}`);
		return rows[0]!.count;
	});
