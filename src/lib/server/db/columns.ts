import { sql } from 'drizzle-orm';
import { bigint, customType, timestamp } from 'drizzle-orm/pg-core';

/** The shop every row belongs to; the first half of every key. */
export const shopColumn = () => bigint('shop_id', { mode: 'number' }).notNull();

/** A row's own number; unique together with the shop. */
export const idColumn = () =>
	bigint('id', { mode: 'number' }).notNull().generatedByDefaultAsIdentity();

/** A reference to another row of the same shop; its foreign key is always (shop_id, this). */
export const refColumn = (name: string) => bigint(name, { mode: 'number' });

export const time = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

export const textArray = customType<{ data: string[]; default: true }>({
	dataType: () => 'text[]'
});

export const emptyArray = sql`'{}'::text[]`;

/** A CHECK's list of words: 'a', 'b'. */
export const words = (list: readonly string[]) =>
	sql.raw(list.map((word) => `'${word.replaceAll("'", "''")}'`).join(', '));
