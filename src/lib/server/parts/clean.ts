import { cleaningOf, type CleaningView } from '$lib/parts/cleaning';
import type { Clean } from '$lib/parts/input';
import { figuresOf } from '$lib/parts/kind-figures';
import { and, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { event } from '../people/tables';
import { chanceBy } from './chance-on';
import { changePart, partFor, partRow, type Done } from './row';
import { partVerdicts, shopFigures } from './verdicts';

/** Minutes of cleaning from which it is asked whether another attempt pays. */
const WORTH_COUNTING = 10;

/** Notes one attempt at cleaning, and whether it came right. */
export const cleanPart = (ctx: Context, tag: string, input: Clean): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'clean');
		const { cameRight, minutes = null } = input;
		return changePart(tx, ctx, row, 'clean', {}, { cameRight, minutes });
	});

/** Attempts that stand, and how many in a row did not help; what was undone does not count. */
async function attemptsOf(tx: Tx, ctx: Context, partId: number) {
	const { rows } = await tx.execute<{ right: boolean }>(sql`
		select (e.detail->>'cameRight')::boolean as right
		from ${event} e
		where e.shop_id = ${ctx.shopId} and e.about = 'part' and e.about_id = ${partId}
			and e.what = 'clean'
			and not exists (
				select from ${event} u
				where u.shop_id = e.shop_id and u.about = 'part' and u.about_id = e.about_id
					and u.what = 'undo' and (u.detail->>'undone')::bigint = e.id)
		order by e.id`);
	const lastRight = rows.findLastIndex(({ right }) => right);
	return { attempts: rows.length, failures: rows.length - 1 - lastRight };
}

async function donorById(tx: Tx, ctx: Context, id: number) {
	const [row] = await tx
		.select()
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, id)));
	return row ?? null;
}

/** Whether one more attempt at cleaning this part pays; null where its kind takes next to no cleaning. */
export const cleaningFor = (ctx: Context, tag: string): Promise<CleaningView | null> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partRow(tx, ctx, tag);
		const { policy } = await shopFigures(ctx, [row.kind]);
		const { cleanMinutes, testMinutes } = figuresOf(row.kind, policy);
		const seen = await attemptsOf(tx, ctx, row.id);
		if (cleanMinutes < WORTH_COUNTING && seen.attempts === 0) return null;
		const worth = (await partVerdicts(ctx, [row.id])).get(row.id);
		const from = row.donorId === null ? null : await donorById(tx, ctx, row.donorId);
		return cleaningOf({
			...seen,
			chance: chanceBy(policy, row.kind, from).chance,
			weight: policy.priors.chance,
			askedCents: worth?.askedCents ?? null,
			scrapCents: worth?.scrapCents ?? 0,
			minutes: cleanMinutes + testMinutes,
			labourHourCents: policy.labourHourCents.normal
		});
	});
