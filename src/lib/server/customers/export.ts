import type { CustomerView } from '$lib/customers/view';
import { asc, eq, and, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { getCustomer } from './queries';
import { customer } from './tables';

/** Everything that the shop holds of one customer beside what they wait for and bought. */
export const exportCustomer = (ctx: Context, id: number): Promise<CustomerView> =>
	inShop(ctx, async (_tx, ctx) => {
		allow(ctx, 'run');
		return getCustomer(ctx, id);
	});

/** Every customer with how they are reached. */
export const exportCustomers = (ctx: Context) =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const { id, name, kind, phone, email, note, lettersOffAt, addedAt } = customer;
		return tx
			.select({ id, name, kind, phone, email, note, lettersOffAt, addedAt })
			.from(customer)
			.where(and(eq(customer.shopId, ctx.shopId), isNull(customer.erasedAt)))
			.orderBy(asc(customer.id));
	});
