import { kinds } from '$lib/trade';
import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { event } from '../people/tables';
import { part } from './tables';

/** Kinds for which a look is the test. */
const LOOKED_OVER = kinds.filter(({ reuse }) => reuse === 'look-over').map(({ id }) => id);

/**
 * Did it fail, come back or go to the red bin, and has no test been passed since?
 * Read from its events; what was undone does not count, nor does a look where the kind asks for a test.
 */
export async function isDoubtful(tx: Tx, ctx: Context, partId: number): Promise<boolean> {
	const { rows } = await tx.execute<{ passed: boolean }>(sql`
		select e.what = 'prove' and (e.detail->>'passed')::boolean as passed
		from ${event} e
		where e.shop_id = ${ctx.shopId} and e.about = 'part' and e.about_id = ${partId}
			and (e.what = 'prove'
				or (e.what in ('pull', 'move', 'take back')
					and e.to_state = 'back' and e.from_state is distinct from 'back'))
			and not (e.what = 'prove' and (e.detail->>'passed')::boolean and e.detail->>'how' = 'look-over'
				and exists (select from ${part} p where p.shop_id = e.shop_id and p.id = e.about_id
					and p.kind <> all(${sql.param(LOOKED_OVER)}::text[])))
			and not exists (
				select from ${event} u
				where u.shop_id = e.shop_id and u.about = 'part' and u.about_id = e.about_id
					and u.what = 'undo' and (u.detail->>'undone')::bigint = e.id)
		order by e.id desc limit 1`);
	return rows[0] !== undefined && !rows[0].passed;
}
