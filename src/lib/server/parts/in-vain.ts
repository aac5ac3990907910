import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import { asked } from '../find/tables';
import { want } from '../wants/tables';
import { part } from './tables';

/** The one engine of the shop's parts that the words name, '' where none or several do. */
const engineMeant = ({ shopId }: Context) => sql`
	coalesce((select case when count(distinct p.engine_key) = 1 then min(p.engine_key) end
		from ${part} p where p.shop_id = ${shopId} and p.kind = a.kind and p.engine_key <> ''
			and a.engine <> '' and strpos(p.engine_key, a.engine) > 0), '')`;

/** Searches that ended in nothing, and wants that nothing was sold to: what was asked for and when. */
const askedFor = ({ shopId }: Context) => sql`
	select kind, replace(engine, ' ', '') as engine, 1 as sought, 0 as wanted, at from ${asked}
		where shop_id = ${shopId}
	union all select kind, regexp_replace(lower(engine), '[^0-9a-z]', '', 'g'), 0, 1, added_at from ${want}
		where shop_id = ${shopId} and kind <> '' and state not in ('got it', 'taken off')`;

/**
 * What was asked for in vain: how often, and the years in which it could be, from the shop's first
 * such asking on as far as none of the kind stood ready. Rests on `stands`: kind, engine_key, since
 * and until of each time one stood, none overlapping, in years.
 */
export const inVain = (ctx: Context, kinds: readonly string[] | null, now: number) => sql`
	select v.kind, v.engine_key as "engineKey", v.sought, v.wanted,
		greatest(0, ${now}::float8 - v.began - coalesce((
			select sum(greatest(0, s.until - greatest(s.since, v.began))) from stands s
			where s.kind = v.kind and (v.engine_key = '' or s.engine_key = v.engine_key)), 0)) as years
	from (
		select a.kind, ${engineMeant(ctx)} as engine_key, sum(sought) as sought, sum(wanted) as wanted,
			(select extract(epoch from min(f.at)) / (365.25 * 24 * 3600)::float8
				from (${askedFor(ctx)}) f) as began
		from (${askedFor(ctx)}) a
			${kinds === null ? sql`` : sql`where a.kind = any(${sql.param([...kinds])}::text[])`}
		group by 1, 2) v`;
