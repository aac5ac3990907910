import { numberKey } from '$lib/codes/number';
import { and, desc, eq, inArray, or } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { supersession } from './tables';

interface Replacing {
	number: string;
	by: string;
	ways: 'one' | 'both';
	note: string;
}

/** Writes that one number is replaced by another; said again, the newer word stands. */
export const replaceNumber = (ctx: Context, input: Replacing): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const said = {
			oldNumber: input.number,
			newNumber: input.by,
			bothWays: input.ways === 'both',
			note: input.note,
			memberId: ctx.memberId,
			at: ctx.now
		};
		const keys = { oldKey: numberKey(input.number), newKey: numberKey(input.by) };
		await tx
			.delete(supersession)
			.where(
				and(
					eq(supersession.shopId, ctx.shopId),
					eq(supersession.oldKey, keys.oldKey),
					eq(supersession.newKey, keys.newKey)
				)
			);
		await tx.insert(supersession).values({ shopId: ctx.shopId, ...keys, ...said });
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'number replaced',
			detail: { ...input }
		});
	});

/** What replaces these numbers and what they replace, the newest word first. */
export const listReplaced = (ctx: Context, numbers: readonly string[]) =>
	inShop(ctx, async (tx, ctx) => {
		const keys = numbers.map(numberKey).filter(Boolean);
		if (keys.length === 0) return [];
		const { id, oldNumber, newNumber, bothWays, note } = supersession;
		return tx
			.select({ id, oldNumber, newNumber, bothWays, note })
			.from(supersession)
			.where(
				and(
					eq(supersession.shopId, ctx.shopId),
					or(inArray(supersession.oldKey, keys), inArray(supersession.newKey, keys))
				)
			)
			.orderBy(desc(supersession.id))
			.limit(20);
	});
