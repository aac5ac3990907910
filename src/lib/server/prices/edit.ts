import type { PriceInput } from '$lib/prices/input';
import { priceFor, type PriceView } from '$lib/prices/view';
import { NotFound, Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq, ne } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { alone } from '../db/alone';
import { allow, getShop } from '../people';
import { refuseChanged, rowOf, said, sameAs, write } from './put';
import { price } from './tables';

/** Changes a price that is on the list; what it is for may change with it. */
export const editPrice = (ctx: Context, id: number, input: PriceInput): Promise<PriceView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const values = rowOf(ctx, input);
		const [before] = await tx
			.select()
			.from(price)
			.where(and(eq(price.shopId, ctx.shopId), eq(price.id, id)))
			.for('no key update');
		if (!before) throw new NotFound('This price is not on the list any more');
		await refuseChanged(ctx, before, values, input.version);
		const [twin] = await tx
			.select()
			.from(price)
			.where(and(sameAs(ctx, values), ne(price.id, id)));
		if (twin)
			throw new Refused(
				'taken',
				`There is a price for ${kind(twin.kind).name}, ${priceFor(twin)} already: ${said(twin, (await getShop(ctx)).currency)}. Change that one.`
			);
		const now = new Refused(
			'taken',
			'Somebody put a price for the same thing on the list just now. Change that one.'
		);
		return alone(write(tx, ctx, before, values), 'price_of', now);
	});
