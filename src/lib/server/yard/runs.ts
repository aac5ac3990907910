import { sayEngine, sayNumber } from '$lib/donors/reference';
import { releaseGate } from '$lib/donors/state';
import { findScrapClass } from '$lib/trade';
import { USUAL_CLASS } from '$lib/yard/carcass';
import type { ReadyDonor, RunItem, RunView } from '$lib/yard/view';
import { and, asc, desc, eq, inArray, lt, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { newestRelease, todayIn } from '../donors';
import { donor } from '../donors/tables';
import { allow } from '../people';
import { member } from '../people/tables';
import { runRow } from './scrap-run';
import { carcass, scrapLoad, scrapRun, scrapRunDonor } from './tables';

const PAGE = 24;

const items = (tx: Tx, ctx: Context) =>
	tx
		.select({
			number: scrapRun.number,
			on: scrapRun.on,
			buyer: scrapRun.buyer,
			ticket: scrapRun.ticket,
			by: member.name,
			takenBackAt: scrapRun.takenBackAt,
			takenBackBecause: scrapRun.takenBackBecause,
			grams: sql<number>`coalesce((select sum(l.grams) from ${scrapLoad} l where l.shop_id = ${ctx.shopId} and l.run_id = ${scrapRun.id}), 0)::int`,
			cents: sql<number>`coalesce((select sum(l.cents) from ${scrapLoad} l where l.shop_id = ${ctx.shopId} and l.run_id = ${scrapRun.id}), 0)::int`,
			donors: sql<
				string[]
			>`coalesce((select array_agg('D' || d.number order by d.number) from ${scrapRunDonor} r
				join ${donor} d on d.shop_id = r.shop_id and d.id = r.donor_id
				where r.shop_id = ${ctx.shopId} and r.run_id = ${scrapRun.id}), '{}')`
		})
		.from(scrapRun)
		.innerJoin(member, and(eq(member.shopId, scrapRun.shopId), eq(member.id, scrapRun.memberId)))
		.$dynamic();

type Row = Awaited<ReturnType<typeof items>>[number];

const item = ({ takenBackAt, takenBackBecause, ...row }: Row): RunItem => ({
	...row,
	takenBack: takenBackAt && {
		at: takenBackAt.toISOString(),
		because: takenBackBecause ?? ''
	}
});

/** Trips to the scrap buyer, the newest first. */
export const listScrapRuns = (
	ctx: Context,
	cursor?: number
): Promise<{ items: RunItem[]; next: number | null }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const rows = await items(tx, ctx)
			.where(
				and(
					eq(scrapRun.shopId, ctx.shopId),
					cursor === undefined ? undefined : lt(scrapRun.number, cursor)
				)
			)
			.orderBy(desc(scrapRun.number))
			.limit(PAGE + 1);
		const shown = rows.slice(0, PAGE);
		return {
			items: shown.map(item),
			next: rows.length > PAGE ? (shown.at(-1)?.number ?? null) : null
		};
	});

export const getScrapRun = (ctx: Context, number: number): Promise<RunView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const { id, note, photoId } = await runRow(tx, ctx, number);
		const [row] = await items(tx, ctx).where(
			and(eq(scrapRun.shopId, ctx.shopId), eq(scrapRun.id, id))
		);
		const loads = await tx
			.select({ scrapClass: scrapLoad.scrapClass, grams: scrapLoad.grams, cents: scrapLoad.cents })
			.from(scrapLoad)
			.where(and(eq(scrapLoad.shopId, ctx.shopId), eq(scrapLoad.runId, id)))
			.orderBy(desc(scrapLoad.cents), asc(scrapLoad.scrapClass));
		const said = (scrapClass: string) => findScrapClass(scrapClass)?.said ?? scrapClass;
		return {
			...item(row!),
			...{ note, photo: photoId },
			loads: loads.map((load) => ({ ...load, said: said(load.scrapClass) }))
		};
	});

/** The stripped donors that stand for the next run, and why one may not go yet. */
export const readyForScrap = (ctx: Context): Promise<ReadyDonor[]> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const rows = await tx
			.select({ donor, grams: carcass.grams, scrapClass: carcass.scrapClass })
			.from(donor)
			.leftJoin(carcass, and(eq(carcass.shopId, donor.shopId), eq(carcass.donorId, donor.id)))
			.where(and(eq(donor.shopId, ctx.shopId), inArray(donor.state, ['stripped'])))
			.orderBy(asc(donor.number));
		const today = await todayIn(ctx);
		const ready: ReadyDonor[] = [];
		for (const { donor: row, grams, scrapClass } of rows) {
			const [gate] = releaseGate(row, await newestRelease(tx, ctx, row.id), today);
			ready.push({
				number: sayNumber(row.number),
				engine: sayEngine(row),
				grams: grams ?? 0,
				scrapClass: scrapClass ?? USUAL_CLASS,
				shut: gate?.said ?? null
			});
		}
		return ready;
	});
