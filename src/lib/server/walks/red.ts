import { ageClock } from '$lib/bins/age';
import { happened } from '$lib/parts/history';
import { kind } from '$lib/trade';
import { redNext } from '$lib/walks/red';
import type { RedPart } from '$lib/walks/view';
import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { partsByIds } from '../parts';
import { part } from '../parts/tables';
import { event, member } from '../people/tables';

const inRed = (tx: Tx, ctx: Context) =>
	tx
		.select({ id: part.id, kind: part.kind, pulledAt: part.pulledAt })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.state, 'back')))
		.orderBy(asc(part.changedAt), asc(part.id))
		.limit(500);

/** The event that brought each of them there. */
async function reasons(tx: Tx, ctx: Context, ids: readonly number[]) {
	const rows = await tx
		.selectDistinctOn([event.aboutId], { event, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(
			and(
				eq(event.shopId, ctx.shopId),
				eq(event.about, 'part'),
				inArray(event.aboutId, [...ids]),
				eq(event.toState, 'back'),
				sql`(${event.fromState} is distinct from 'back' or (${event.what} = 'prove' and not (${event.detail}->>'passed')::boolean))`
			)
		)
		.orderBy(event.aboutId, desc(event.id));
	return new Map(rows.map((row) => [row.event.aboutId, row]));
}

const hasFailed = ({ what, detail }: { what: string; detail: Record<string, unknown> }) =>
	(what === 'prove' && detail.passed === false) ||
	(what === 'pull' && (detail.proof as { passed?: boolean } | undefined)?.passed === false);

/** What lies in the red bins, the longest there first, with what to do next. */
export const redParts = (ctx: Context): Promise<RedPart[]> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await inRed(tx, ctx);
		if (rows.length === 0) return [];
		const ids = rows.map(({ id }) => id);
		const items = new Map((await partsByIds(ctx, ids)).map((item) => [item.id, item]));
		const why = await reasons(tx, ctx, ids);
		return rows.flatMap((row) => {
			const item = items.get(row.id);
			if (!item) return [];
			const came = why.get(row.id);
			const failed = came ? hasFailed(came.event) : false;
			const { howTested, testMinutes } = kind(row.kind);
			return {
				...{ item, since: came?.event.at ?? row.pulledAt, by: came?.by ?? '' },
				because: came ? happened(came.event) : 'In doubt',
				...redNext({ kind: row.kind, verdict: item.verdict, failed }),
				...{ howTested, testMinutes },
				age: ageClock(row.kind, row.pulledAt, null, ctx.now)
			};
		});
	});
