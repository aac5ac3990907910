import type { DonorItem } from '$lib/donors/view';
import { DONOR_STATES, type DonorState } from '$lib/donors/words';
import { donorNumber } from '$lib/donors/reference';
import { dayIn } from '$lib/donors/day';
import { engineKey } from '$lib/codes/number';
import { and, desc, eq, ilike, lt, or, sql, type SQL } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { getShop } from '../people';
import { around } from './around';
import { donorItem } from './item';
import { donor } from './tables';

export interface DonorFilter {
	state?: DonorState | undefined;
	q?: string | undefined;
	/** The number of the last one seen. */
	cursor?: number | undefined;
	limit?: number | undefined;
}

export interface DonorList {
	items: DonorItem[];
	next: number | null;
	counts: Record<DonorState, number>;
}

const like = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

/** Words of a search: a number, an engine however spaced, a serial, a machine. */
function matching(q: string): SQL | undefined {
	const number = donorNumber(q);
	const key = engineKey(q);
	return or(
		number === null ? undefined : eq(donor.number, number),
		key ? ilike(donor.engineKey, like(key)) : undefined,
		ilike(donor.serial, like(q)),
		ilike(donor.typeCode, like(q)),
		ilike(donor.offMachine, like(q))
	);
}

async function countStates(tx: Tx, ctx: Context, q: string): Promise<DonorList['counts']> {
	const rows = await tx
		.select({ state: donor.state, count: sql<number>`count(*)::int` })
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), q ? matching(q) : undefined))
		.groupBy(donor.state);
	const counts = Object.fromEntries(DONOR_STATES.map((state) => [state, 0]));
	for (const { state, count } of rows) counts[state] = count;
	return counts as DonorList['counts'];
}

/** Donors, the newest first; without a state those that are not gone. */
export const listDonors = (ctx: Context, filter: DonorFilter = {}): Promise<DonorList> =>
	inShop(ctx, async (tx, ctx) => {
		const { state, cursor } = filter;
		const q = filter.q?.trim() ?? '';
		const limit = Math.min(Math.max(filter.limit ?? 24, 1), 100);
		const rows = await tx
			.select()
			.from(donor)
			.where(
				and(
					eq(donor.shopId, ctx.shopId),
					state ? eq(donor.state, state) : sql`${donor.state} <> 'gone'`,
					q ? matching(q) : undefined,
					cursor === undefined ? undefined : lt(donor.number, cursor)
				)
			)
			.orderBy(desc(donor.number))
			.limit(limit + 1);
		const shown = rows.slice(0, limit);
		const near = await around(
			tx,
			ctx,
			shown.map((row) => row.id)
		);
		const { slug, timeZone } = await getShop(ctx);
		const today = dayIn(timeZone, ctx.now);
		return {
			items: shown.map((row) => donorItem(row, near, slug, today)),
			next: rows.length > limit ? (shown.at(-1)?.number ?? null) : null,
			counts: await countStates(tx, ctx, q)
		};
	});

/** The makers this shop has seen, those used last first. */
export const listMakers = (ctx: Context): Promise<string[]> =>
	inShop(ctx, async (tx) => {
		const rows = await tx
			.select({ maker: donor.maker })
			.from(donor)
			.where(and(eq(donor.shopId, ctx.shopId), sql`${donor.maker} <> ''`))
			.groupBy(donor.maker)
			.orderBy(desc(sql`max(${donor.id})`))
			.limit(40);
		return rows.map((row) => row.maker);
	});
