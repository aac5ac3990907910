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

/** A statement with its values in their places; each $n stands once, in order. */
const filled = (text: string, values: readonly unknown[]) =>
	sql.join(
		text
			.split(/\$\d+/)
			.flatMap((piece, at) =>
				at === 0 ? [sql.raw(piece)] : [sql.param(values[at - 1]), sql.raw(piece)]
			)
	);

/**
 * One reading in one trip to the database. `list` is what is selected: calls of functions only, since they run after
 * the shop is set by the statement itself. Its values are $2 and on; the plan is kept under the name.
 */
export async function readInShop<Row extends Record<string, unknown>>(
	{ db, tx, shopId }: Context,
	name: string,
	list: string,
	values: readonly unknown[]
): Promise<Row> {
	if (tx) return (await tx.execute(filled(`select ${list}`, values))).rows[0] as Row;
	const text = `with here as materialized (select set_config('endplay.shop', $1, true)) select ${list} from here`;
	const { rows } = await db.$client.query({ name, text, values: [String(shopId), ...values] });
	return rows[0] as Row;
}
