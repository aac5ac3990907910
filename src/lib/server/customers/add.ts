import type { CustomerInput } from '$lib/customers/input';
import { phoneKey } from '$lib/customers/reach';
import { Refused } from '$lib/refusal';
import { and, asc, eq, isNull, or } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { columnsOf } from './rows';
import { customer } from './tables';

const LEAST_FIGURES = 6;

/** Who has this number or this address already, if anybody; except one whom it is asked about. */
export async function sameReach(
	tx: Tx,
	ctx: Context,
	{ phone, email }: { phone: string; email: string }
) {
	const key = phoneKey(phone);
	const either = or(
		key.length >= LEAST_FIGURES ? eq(customer.phoneKey, key) : undefined,
		email ? eq(customer.email, email) : undefined
	);
	if (!either) return [];
	return tx
		.select({ id: customer.id, name: customer.name })
		.from(customer)
		.where(and(eq(customer.shopId, ctx.shopId), isNull(customer.erasedAt), either))
		.orderBy(asc(customer.id))
		.limit(2);
}

async function insert(tx: Tx, ctx: Context, input: CustomerInput): Promise<number> {
	const [row] = await tx
		.insert(customer)
		.values({ ...columnsOf(input), shopId: ctx.shopId, addedAt: ctx.now })
		.returning({ id: customer.id });
	// Nothing of a person stands in the record of events: it can be deleted, events cannot.
	await record(tx, ctx, { about: 'customer', aboutId: row!.id, what: 'added' });
	return row!.id;
}

/** Adds somebody; refused where their number or address is known, with who has it. */
export const addCustomer = (ctx: Context, input: CustomerInput): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const [same] = await sameReach(tx, ctx, input);
		if (same)
			throw new Refused('taken', `${same.name} has this number or address already.`, 'phone');
		return { id: await insert(tx, ctx, input) };
	});

/** The one who has this number or address, else somebody new: nobody is entered twice. */
export const knownCustomer = (ctx: Context, input: CustomerInput): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const [same] = await sameReach(tx, ctx, input);
		return { id: same?.id ?? (await insert(tx, ctx, input)) };
	});
