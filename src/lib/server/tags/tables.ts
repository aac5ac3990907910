import { sql } from 'drizzle-orm';
import { check, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { shopColumn, time, words } from '../db/columns';
import { shop } from '../people/tables';

export const TAGGED = ['box', 'part', 'bin'] as const;

/** The one code space of a shop: what a code was given to. */
export const tag = pgTable(
	'tag',
	{
		shopId: shopColumn().references(() => shop.id),
		code: text('code').notNull(),
		what: text('what', { enum: TAGGED }).notNull(),
		mintedAt: time('minted_at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.code] }),
		check('tag_what', sql`${t.what} in (${words(TAGGED)})`),
		check('tag_code', sql`${t.code} ~ '^[0-9A-HJKMNP-TV-Z]{5}$'`)
	]
);
