import type { Observed, TestsSeen } from '$lib/parts/learned-view';
import { MISTAKE } from '$lib/parts/state';
import { isCauseId } from '$lib/trade';
import { sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { foundBy } from '../find/tables';
import { event } from '../people/tables';
import { inVain } from './in-vain';
import { part, proof } from './tables';

/** So many sales, the latest, tell what is paid; older ones say less of it every year. */
const SALES = 300;

const YEAR_SECONDS = 365.25 * 24 * 3600;

const yearOf = (time: ReturnType<typeof sql>) =>
	sql`extract(epoch from ${time}) / ${YEAR_SECONDS}::float8`;

/** Parts of these kinds, all that the shop ever had; a row logged by mistake never was one. */
const stock = ({ shopId, now }: Context, kinds: readonly string[] | null) => sql`
	select p.id, p.kind, coalesce(nullif(p.engine_key, ''), d.engine_key, '') as engine_key,
		d.cause, d.second_cause, d.sureness, p.state, ${yearOf(sql`p.pulled_at`)} as since,
		${yearOf(sql`greatest(p.pulled_at, case when p.state in ('pulled', 'shelved', 'held')
			then ${now.toISOString()}::timestamptz else p.changed_at end)`)} as until
	from ${part} p left join ${donor} d on d.shop_id = p.shop_id and d.id = p.donor_id
	where p.shop_id = ${shopId} and p.scrap_reason is distinct from ${MISTAKE}
		${kinds === null ? sql`` : sql`and p.kind = any(${sql.param([...kinds])}::text[])`}`;

/** What left and what came back, less what was undone. */
const moved = ({ shopId }: Context) => sql`
	select s.id, s.kind, s.engine_key,
		count(*) filter (where e.what in ('fit', 'sell'))
			- count(*) filter (where e.what = 'undo' and e.from_state = 'out' and e.to_state <> 'out') as out,
		count(*) filter (where e.what = 'take back')
			- count(*) filter (where e.what = 'undo' and e.to_state = 'out' and e.from_state <> 'out') as back,
		min(e.at) filter (where e.what = 'take back') as first_back
	from stock s join ${event} e on e.shop_id = ${shopId} and e.about = 'part' and e.about_id = s.id
	where e.what in ('fit', 'sell', 'take back', 'undo') group by s.id, s.kind, s.engine_key`;

/** The latest bench test of each part; a test after a come-back says nothing of the donor's death. */
const tests = ({ shopId }: Context) => sql`
	select t.kind, t.cause, t.second_cause as "secondCause", t.sureness,
		count(*) filter (where t.passed) as passed, count(*) filter (where not t.passed) as failed
	from (
		select distinct on (s.id) s.*, t.passed
		from stock s join ${proof} t on t.shop_id = ${shopId} and t.part_id = s.id
			left join moved m on m.id = s.id
		where t.how like 'bench test%' and (m.first_back is null or t.at <= m.first_back)
		order by s.id, t.id desc) t
	group by 1, 2, 3, 4`;

/** Uses, sales and parts held now. What else is a call is added as rows of kind, engine and how many. */
const called = sql`
	select kind, engine_key, out as calls from moved
	union all select kind, engine_key, 1 from stock where state = 'held'`;

/** A call can only be met, and so be seen, while one stands there: years that overlap count once. */
const stands = sql`
	select kind, engine_key, greatest(since, before) as since, greatest(until, before) as until
	from (select *, max(until) over (partition by kind, engine_key order by since, id
		rows between unbounded preceding and 1 preceding) as before from stock) s`;

const calls = sql`
	select kind, engine_key as "engineKey", sum(calls) as calls, sum(years) as years
	from (select kind, engine_key, calls, 0::float8 as years from (${called}) c
		union all select kind, engine_key, 0, until - since from stands) x
	group by 1, 2`;

const sales = ({ shopId }: Context) => sql`
	select p.grade, f.new_cents as "newCents", f.copy_cents as "copyCents", p.out_cents as "paidCents"
	from (select * from ${part} where shop_id = ${shopId} and state = 'out' and out_as = 'sold' and out_cents > 0
			order by changed_at desc limit ${SALES}) p
		join ${foundBy} f on f.shop_id = ${shopId} and f.part_id = p.id
	where f.new_cents is not null`;

const listed = (rows: ReturnType<typeof sql>) =>
	sql`(select coalesce(json_agg(r), '[]') from (${rows}) r)`;

type Row = Record<string, unknown> &
	Observed & { tests: (TestsSeen & Record<'cause' | 'secondCause', string | null>)[] };

const causeOf = (id: string | null) => (id && isCauseId(id) ? id : null);

/** What the history of the shop says of these kinds, of all where none are named: one query. */
export async function observed(
	tx: Tx,
	ctx: Context,
	kinds: readonly string[] | null
): Promise<Observed> {
	const { rows } = await tx.execute<Row>(sql`
		with stock as materialized (${stock(ctx, kinds)}), moved as materialized (${moved(ctx)}),
			stands as materialized (${stands})
		select ${listed(tests(ctx))} as tests, ${listed(calls)} as calls, ${listed(sales(ctx))} as sales,
			${listed(inVain(ctx, kinds, ctx.now.getTime() / 1000 / YEAR_SECONDS))} as asked,
			${listed(sql`select kind, sum(out) as out, sum(back) as back from moved group by kind`)} as outs`);
	const { tests: tested, ...rest } = rows[0]!;
	return {
		...rest,
		tests: tested.map((row) => ({
			...row,
			cause: causeOf(row.cause),
			secondCause: causeOf(row.secondCause)
		}))
	};
}
