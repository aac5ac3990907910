import { sayDay } from '$lib/donors/day';
import { Refused, NotFound } from '$lib/refusal';
import type { ScrapRun, TakeBackRun } from '$lib/yard/input';
import { and, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { bringBackDonor, donorRow, leaveDonor, todayIn } from '../donors';
import { donor } from '../donors/tables';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import { addPhotoRow, type KeptPhoto } from '../photos';
import { scrapLoad, scrapRun, scrapRunDonor } from './tables';

async function nextNumber(tx: Tx, ctx: Context): Promise<number> {
	const [row] = await tx
		.update(shop)
		.set({ lastScrapRunNumber: sql`${shop.lastScrapRunNumber} + 1` })
		.where(eq(shop.id, ctx.shopId))
		.returning({ number: shop.lastScrapRunNumber });
	return row!.number;
}

async function dayOf(ctx: Context, on: string | undefined): Promise<string> {
	const today = await todayIn(ctx);
	if (on && on > today)
		throw new Refused('bad input', `Enter a day up to today, ${sayDay(today, today)}.`, 'on');
	return on ?? today;
}

/** A trip to the scrap buyer: kilos and money by class, the weigh ticket, and the donors that it closes. */
export const addScrapRun = (
	ctx: Context,
	{ donors, loads, on, ...input }: ScrapRun,
	ticket?: KeptPhoto
): Promise<{ number: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const photo = ticket && (await addPhotoRow(ctx, ticket));
		const { shopId, memberId, now } = ctx;
		const number = await nextNumber(tx, ctx);
		const [run] = await tx
			.insert(scrapRun)
			.values({
				...{ ...input, shopId, memberId, number, at: now },
				...{ on: await dayOf(ctx, on), photoId: photo?.id ?? null }
			})
			.returning({ id: scrapRun.id });
		const runId = run!.id;
		await tx.insert(scrapLoad).values(loads.map((load) => ({ ...load, shopId, runId })));
		for (const ref of [...new Set(donors)].sort()) {
			const { id } = await donorRow(tx, ctx, ref, { lock: true });
			await leaveDonor(ctx, ref, 'scrap', { run: number });
			await tx.insert(scrapRunDonor).values({ shopId, runId, donorId: id });
		}
		const cents = loads.reduce((sum, load) => sum + load.cents, 0);
		await record(tx, ctx, {
			...{ about: 'shop', aboutId: shopId, what: 'scrap run' },
			detail: { number, buyer: input.buyer, cents, donors }
		});
		return { number };
	});

export async function runRow(tx: Tx, ctx: Context, number: number, lock = false) {
	const query = tx
		.select()
		.from(scrapRun)
		.where(and(eq(scrapRun.shopId, ctx.shopId), eq(scrapRun.number, number)));
	const [row] = await (lock ? query.for('no key update') : query);
	if (!row) throw new NotFound();
	return row;
}

/** A run that was written down wrongly: it stays to be read, its donors come back. */
export const takeBackScrapRun = (
	ctx: Context,
	number: number,
	{ reason }: TakeBackRun
): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const run = await runRow(tx, ctx, number, true);
		if (run.takenBackAt) throw new Refused('gate', 'This run is taken back already.');
		await tx
			.update(scrapRun)
			.set({ takenBackAt: ctx.now, takenBackBecause: reason })
			.where(and(eq(scrapRun.shopId, ctx.shopId), eq(scrapRun.id, run.id)));
		const closed = await tx
			.select({ number: donor.number })
			.from(scrapRunDonor)
			.innerJoin(
				donor,
				and(eq(donor.shopId, scrapRunDonor.shopId), eq(donor.id, scrapRunDonor.donorId))
			)
			.where(and(eq(scrapRunDonor.shopId, ctx.shopId), eq(scrapRunDonor.runId, run.id)))
			.orderBy(donor.number);
		for (const one of closed)
			await bringBackDonor(ctx, `D${one.number}`, { reason: `scrap run ${number}: ${reason}` });
		await record(tx, ctx, {
			...{ about: 'shop', aboutId: ctx.shopId, what: 'took back a scrap run' },
			detail: { number, reason }
		});
	});
