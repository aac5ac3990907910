import { and, eq, inArray, isNotNull, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { partVerdicts } from '../parts';
import { part } from '../parts/tables';

const AT_ONCE = 500;
const STANDS = ['shelved', 'held', 'back', 'pulled'] as const;

/** What is asked for the parts in each bin, all together, in cents. */
export const moneyInBins = (ctx: Context): Promise<Map<number, number>> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await tx
			.select({ id: part.id, binId: part.binId })
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), isNotNull(part.binId), inArray(part.state, STANDS)));
		const money = new Map<number, number>();
		for (let at = 0; at < rows.length; at += AT_ONCE) {
			const some = rows.slice(at, at + AT_ONCE);
			const verdicts = await partVerdicts(
				ctx,
				some.map(({ id }) => id)
			);
			for (const { id, binId } of some) {
				const asked = verdicts.get(id)?.askedCents ?? 0;
				money.set(binId ?? 0, (money.get(binId ?? 0) ?? 0) + asked);
			}
		}
		return money;
	});

/** How many days the parts in each bin have lain there since they were pulled, in the middle. */
export const daysInBins = (ctx: Context): Promise<Map<number, number>> =>
	inShop(ctx, async (tx, ctx) => {
		const rows = await tx
			.select({
				binId: sql<number>`${part.binId}`.mapWith(Number),
				days: sql<number>`(percentile_cont(0.5) within group (order by
					extract(epoch from ${ctx.now.toISOString()}::timestamptz - ${part.pulledAt}) / 86400))::int`
			})
			.from(part)
			.where(and(eq(part.shopId, ctx.shopId), isNotNull(part.binId), inArray(part.state, STANDS)))
			.groupBy(part.binId);
		return new Map(rows.map(({ binId, days }) => [binId, days]));
	});
