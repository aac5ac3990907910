import type { FindQuery } from '$lib/find/input';
import type { Plan } from '$lib/find/plan';
import type { Facet } from '$lib/find/view';
import { sql, type SQL } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { filtersOf, without, type Filter } from './filters';
import { hitsOf } from './hits';
import { shelfOf } from './rows';

interface Placed {
	id: number;
	at: string;
}

export interface Shelf {
	ids: number[];
	next: string | null;
	total: number;
	facets: Record<'kind' | 'grade' | 'state' | 'bin', Facet[]>;
}

const MOST_PLACES = 20;
const COLUMN = { kind: 'kind', grade: 'grade', state: 'state', bin: 'place' } as const;

function counted(filters: Record<Filter, SQL>, facet: keyof typeof COLUMN): SQL {
	const column = sql.raw(COLUMN[facet]);
	const most = sql.raw(facet === 'bin' ? `limit ${MOST_PLACES}` : '');
	return sql`(select coalesce(json_agg(json_build_object('value', value, 'count', count)), '[]') from (
		select ${column} as value, count(*)::int as count from answers
		where ${without(filters, facet)} and ${column} is not null
		group by 1 order by 2 desc, 1 ${most}) f)`;
}

/** After the last one seen: the five figures of its place in the order. */
function after(cursor: string | undefined): SQL {
	if (!cursor) return sql`true`;
	const figures = cursor.split('.').map((figure) => sql`${figure}::bigint`);
	return sql`(stands, tier, unlike, aged, id) > (${sql.join(figures, sql`, `)})`;
}

/** One look at the shelf: a page of ids, how many there are, and what they could be narrowed to. */
export async function lookAtShelf(
	tx: Tx,
	ctx: Context,
	plan: Plan,
	query: FindQuery
): Promise<Shelf> {
	const filters = filtersOf(query);
	const { rows } = await tx.execute<{ page: Placed[]; total: number } & Shelf['facets']>(sql`
		with shelf as materialized (${shelfOf(ctx)}), ${hitsOf(plan)},
		answers as materialized (select s.*, h.tier, h.unlike from hits h join shelf s on s.id = h.id)
		select (select count(*)::int from answers where ${without(filters)}) as total,
			${counted(filters, 'kind')} as kind, ${counted(filters, 'grade')} as grade,
			${counted(filters, 'state')} as state, ${counted(filters, 'bin')} as bin,
			(select coalesce(json_agg(p), '[]') from (
				select id, concat_ws('.', stands, tier, unlike, aged, id) as at from answers
				where ${without(filters)} and ${after(query.cursor)}
				order by stands, tier, unlike, aged, id limit ${query.limit + 1}) p) as page`);
	const { page, total, ...facets } = rows[0]!;
	const shown = page.slice(0, query.limit);
	const more = page.length > query.limit;
	return {
		ids: shown.map((one) => Number(one.id)),
		next: more ? (shown.at(-1)?.at ?? null) : null,
		total,
		facets
	};
}
