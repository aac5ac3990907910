import { whyPurge } from '$lib/walks/purge';
import type { Verdict } from '$lib/parts/verdict-view';
import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { asked } from '../find/tables';
import { partVerdicts } from '../parts';
import { part } from '../parts/tables';
import { event } from '../people/tables';
import { want } from '../wants/tables';
import type { ToDo } from './to-walk';
import { walk, walkStop } from './tables';

const AT_ONCE = 500;

/** The last call for each kind and engine; a search or a want counts for the kind as a whole. */
async function lastCalls(
	tx: Tx,
	ctx: Context
): Promise<(kind: string, engine: string) => Date | null> {
	const { rows } = await tx.execute<{ kind: string; engine: string; at: string }>(sql`
		select kind, engine, max(at) as at from (
			select p.kind, p.engine_key as engine, e.at from ${event} e
				join ${part} p on p.shop_id = e.shop_id and p.id = e.about_id
				where e.shop_id = ${ctx.shopId} and e.about = 'part' and e.what in ('fit', 'sell', 'hold')
			union all select kind, '*', at from ${asked} where shop_id = ${ctx.shopId}
			union all select kind, '*', added_at from ${want} where shop_id = ${ctx.shopId} and kind <> '') c
		group by 1, 2`);
	const known = new Map(rows.map((row) => [`${row.kind} ${row.engine}`, new Date(row.at)]));
	return (kind, engine) => {
		const [one, any] = [known.get(`${kind} ${engine}`), known.get(`${kind} *`)];
		return one && any ? (one > any ? one : any) : (one ?? any ?? null);
	};
}

/** What was said at purges before: when a part was kept, and of what is no longer made. */
async function saidBefore(tx: Tx, ctx: Context) {
	const rows = await tx
		.select({
			id: part.id,
			kind: part.kind,
			engineKey: part.engineKey,
			outcome: walkStop.outcome,
			at: walkStop.at
		})
		.from(walkStop)
		.innerJoin(part, and(eq(part.shopId, walkStop.shopId), eq(part.id, walkStop.partId)))
		.where(
			and(
				eq(walkStop.shopId, ctx.shopId),
				inArray(walkStop.outcome, ['kept', 'price down', 'no longer made'])
			)
		)
		.orderBy(asc(walkStop.at));
	const keptAt = new Map(rows.map((row) => [row.id, row.at]));
	const old = rows.filter((row) => row.outcome === 'no longer made');
	const gone = new Set(old.map((row) => (row.engineKey ? `${row.kind} ${row.engineKey}` : row.id)));
	return {
		keptAt: (id: number) => keptAt.get(id) ?? null,
		noLongerMade: (row: { id: number; kind: string; engineKey: string }) =>
			gone.has(row.id) || gone.has(`${row.kind} ${row.engineKey}`)
	};
}

const onAnother = (ctx: Context) => sql`exists (
	select from ${walkStop} s join ${walk} w on w.shop_id = s.shop_id and w.id = s.walk_id
	where s.shop_id = ${ctx.shopId} and s.part_id = ${part.id} and w.what = 'purge'
		and w.ended_at is null and s.outcome is null)`;

const shelved = (tx: Tx, ctx: Context) =>
	tx
		.select()
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				inArray(part.state, ['shelved', 'pulled']),
				sql`not ${onAnother(ctx)}`,
				isNull(part.heldFor)
			)
		)
		.orderBy(asc(part.id));

/** What a purge would be about now: parts nobody calls for, and those not worth their place. */
export async function purgeStops(tx: Tx, ctx: Context): Promise<ToDo[]> {
	const rows = await shelved(tx, ctx);
	const verdicts = new Map<number, Verdict>();
	for (let at = 0; at < rows.length; at += AT_ONCE) {
		const ids = rows.slice(at, at + AT_ONCE).map(({ id }) => id);
		for (const [id, verdict] of await partVerdicts(ctx, ids)) verdicts.set(id, verdict);
	}
	const lastCall = await lastCalls(tx, ctx);
	const before = await saidBefore(tx, ctx);
	return rows.flatMap((row) => {
		const worth = verdicts.get(row.id);
		const why = whyPurge(
			{
				...{ state: row.state, pulledAt: row.pulledAt },
				...{ place: worth?.place ?? 1, have: worth?.have ?? 1, verdict: worth?.verdict ?? null },
				lastCall: lastCall(row.kind, row.engineKey),
				waiting: (worth?.waitingFor ?? null) !== null,
				...{ noLongerMade: before.noLongerMade(row), keptAt: before.keptAt(row.id) }
			},
			ctx.now
		);
		return why === null ? [] : [{ partId: row.id, binId: row.binId, why }];
	});
}
