import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { enqueue } from '../queue/enqueue';
import { customerRow, ownCustomer } from './queries';
import { customer, letter } from './tables';

/**
 * Takes name, reach and letters of a customer away, on their request. The row stays for what it is tied to:
 * sales, offers and wants are then those of "a customer". Rooms to the right hear of it.
 */
export const eraseCustomer = (ctx: Context, id: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const row = await customerRow(tx, ctx, id, 'lock');
		const nothing = { name: '', phone: '', phoneKey: '', email: '', note: '', foundBy: '' };
		await tx
			.update(customer)
			.set({ ...nothing, erasedAt: ctx.now, version: row.version + 1 })
			.where(ownCustomer(ctx, id));
		const theirs = and(eq(letter.shopId, ctx.shopId), eq(letter.customerId, id));
		await tx.update(letter).set({ to: '', subject: '', text: '', fault: '' }).where(theirs);
		await tx
			.update(letter)
			.set({ state: 'failed' })
			.where(and(theirs, eq(letter.state, 'waiting')));
		await record(tx, ctx, { about: 'customer', aboutId: id, what: 'erased' });
		const { shopId, memberId, now } = ctx;
		await enqueue(tx, 'customers.erased', { shopId, memberId, customerId: id, at: now });
	});
