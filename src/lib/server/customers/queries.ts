import { sought } from '$lib/customers/reach';
import type { CustomerItem, CustomerView } from '$lib/customers/view';
import { ERASED_SAID } from '$lib/customers/words';
import { NotFound } from '$lib/refusal';
import { and, asc, desc, eq, isNull, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow } from '../people';
import { want } from '../wants/tables';
import { lettersTo } from './letters';
import { customer } from './tables';

export type CustomerRow = typeof customer.$inferSelect;

export const ownCustomer = (ctx: Context, id: number) =>
	and(eq(customer.shopId, ctx.shopId), eq(customer.id, id));

/** A customer's row, locked when it is about to change; one that is erased is not there any more. */
export async function customerRow(
	tx: Tx,
	ctx: Context,
	id: number,
	lock: 'lock' | 'look' = 'look'
): Promise<CustomerRow> {
	const query = tx
		.select()
		.from(customer)
		.where(and(ownCustomer(ctx, id), isNull(customer.erasedAt)));
	const [row] = await (lock === 'lock' ? query.for('no key update') : query);
	if (!row) throw new NotFound();
	return row;
}

const waits = sql<number>`(select count(*)::int from ${want} where ${want.shopId} = ${customer.shopId}
	and ${want.customerId} = ${customer.id} and ${want.state} in ('waiting', 'told', 'said yes', 'gone quiet'))`;

const item = {
	id: customer.id,
	name: customer.name,
	kind: customer.kind,
	phone: customer.phone,
	email: customer.email,
	waits
};

const PAGE = 50;

/** Wild cards of LIKE that were typed stand for themselves. */
const piece = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

interface Asked {
	q?: string;
	/** The last one of the page before. */
	after?: number;
	limit?: number;
}

const isAfter = (ctx: Context, id: number) =>
	sql`(lower(${customer.name}), ${customer.id}) > (select lower(c.name), c.id from ${customer} c
		where c.shop_id = ${ctx.shopId} and c.id = ${id})`;

/** Those whose name, number or address has every piece of what was typed, by name. */
export const listCustomers = (
	ctx: Context,
	{ q = '', after, limit = PAGE }: Asked = {}
): Promise<{ items: CustomerItem[]; next: string | null }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const most = Math.min(Math.max(1, limit), 100);
		const rows = await tx
			.select(item)
			.from(customer)
			.where(
				and(
					eq(customer.shopId, ctx.shopId),
					isNull(customer.erasedAt),
					...sought(q).map((one) => sql`${customer.foundBy} like ${piece(one)}`),
					after === undefined ? undefined : isAfter(ctx, after)
				)
			)
			.orderBy(sql`lower(${customer.name})`, asc(customer.id))
			.limit(most + 1);
		const items = rows.slice(0, most);
		return { items, next: rows.length > most ? String(items.at(-1)!.id) : null };
	});

/** One customer with the letters that went to them; of one that is erased what the books still say. */
export const getCustomer = (ctx: Context, id: number): Promise<CustomerView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'trade');
		const { note, lettersOffAt, erasedAt, addedAt, version } = customer;
		const [row] = await tx
			.select({ ...item, note, lettersOffAt, erasedAt, addedAt, version })
			.from(customer)
			.where(ownCustomer(ctx, id))
			.orderBy(desc(customer.id));
		if (!row) throw new NotFound();
		const name = row.erasedAt ? ERASED_SAID[row.kind] : row.name;
		return { ...row, name, letters: await lettersTo(tx, ctx, id) };
	});
