import type { Role } from '$lib/people/role';
import { sql } from 'drizzle-orm';
import type { Db, Tx } from './db';

/** Who asks, for which shop, when. Every query and verb starts from it. */
export interface Context {
	db: Db;
	shopId: number;
	memberId: number;
	role: Role;
	now: Date;
	/** Set while a transaction is open, so that verbs nest into one. */
	tx?: Tx;
}

/** Runs work in one transaction with the shop set for the row policies; nested calls join the open one. */
export async function inShop<T>(
	ctx: Context,
	work: (tx: Tx, ctx: Context) => Promise<T>
): Promise<T> {
	if (ctx.tx) return work(ctx.tx, ctx);
	return ctx.db.transaction(async (tx) => {
		await tx.execute(sql`select set_config('endplay.shop', ${String(ctx.shopId)}, true)`);
		return work(tx, { ...ctx, tx });
	});
}
