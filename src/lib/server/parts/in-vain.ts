import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import { asked } from '../find/tables';
import { part } from './tables';

/** The one engine of the shop's parts that the words name, '' where none or several do. */
const engineMeant = ({ shopId }: Context) => sql`
	coalesce((select case when count(distinct p.engine_key) = 1 then min(p.engine_key) end
		from ${part} p where p.shop_id = ${shopId} and p.kind = a.kind and p.engine_key <> ''
			and replace(a.engine, ' ', '') <> '' and strpos(p.engine_key, replace(a.engine, ' ', '')) > 0), '')`;

/**
 * Searches that ended in nothing: how often, and the years in which one could, from the shop's first
 * such search on as far as none of the kind stood ready. Rests on `stands`: kind, engine_key, since
 * and until of each time one stood, none overlapping, in years.
 */
export const inVain = (ctx: Context, kinds: readonly string[] | null, now: number) => sql`
	select v.kind, v.engine_key as "engineKey", v.calls,
		greatest(0, ${now}::float8 - v.began - coalesce((
			select sum(greatest(0, s.until - greatest(s.since, v.began))) from stands s
			where s.kind = v.kind and (v.engine_key = '' or s.engine_key = v.engine_key)), 0)) as years
	from (
		select a.kind, ${engineMeant(ctx)} as engine_key, count(*) as calls,
			(select extract(epoch from min(f.at)) / (365.25 * 24 * 3600)::float8 from ${asked} f
				where f.shop_id = ${ctx.shopId}) as began
		from ${asked} a where a.shop_id = ${ctx.shopId}
			${kinds === null ? sql`` : sql`and a.kind = any(${sql.param([...kinds])}::text[])`}
		group by 1, 2) v`;
