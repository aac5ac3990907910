import { dayAfter } from '$lib/donors/day';
import type { MoveInput } from '$lib/donors/input';
import type { DonorState } from '$lib/donors/words';
import { Refused } from '$lib/refusal';
import { and, desc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, getPolicy } from '../people';
import { event } from '../people/tables';
import { move } from './moves';
import { donorRow, todayIn } from './rows';
import { writeMove } from './write-move';

/** The engine leaves for good, to the scrap or sold whole, once its release is in order; `detail` says with which run or slip. */
export const leaveDonor = (
	ctx: Context,
	ref: string,
	how: 'scrap' | 'sell',
	detail: Record<string, unknown> = {}
) => move(ctx, ref, how, {}, detail);

/** What left comes back, to the state that it left from. */
export const bringBackDonor = (ctx: Context, ref: string, { reason }: MoveInput): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		if (row.state !== 'gone') throw new Refused('gate', `It is ${row.state}, not gone.`);
		const [left] = await tx
			.select({ from: event.fromState })
			.from(event)
			.where(
				and(
					eq(event.shopId, ctx.shopId),
					eq(event.about, 'donor'),
					eq(event.aboutId, row.id),
					eq(event.toState, 'gone')
				)
			)
			.orderBy(desc(event.id))
			.limit(1);
		const to = (left?.from ?? 'stripped') as DonorState;
		const detail = reason ? { reason } : {};
		await writeMove(tx, ctx, row, { to, what: 'brought back', set: {}, detail });
	});

/** A parked one was looked at and stays for another while. */
export const reviewDonor = (ctx: Context, ref: string): Promise<{ reviewOn: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		if (row.state !== 'parked') throw new Refused('gate', `It is ${row.state}, not parked.`);
		const { parkedReviewDays } = await getPolicy(ctx);
		const reviewOn = dayAfter(await todayIn(ctx), parkedReviewDays);
		const detail = { reviewOn };
		await writeMove(tx, ctx, row, {
			...{ to: 'parked', what: 'looked at it: stays parked', set: { reviewOn }, detail }
		});
		return { reviewOn };
	});
