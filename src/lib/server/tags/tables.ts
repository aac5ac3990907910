import { sql } from 'drizzle-orm';
import { check, index, integer, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { shopColumn, time, words } from '../db/columns';
import { shop } from '../people/tables';

export const TAGGED = ['box', 'part', 'bin'] as const;
/** A blank is printed in advance; the first scan says what it is for. */
const WHAT = [...TAGGED, 'blank'] as const;

/** The one code space of a shop: what a code was given to. */
export const tag = pgTable(
	'tag',
	{
		shopId: shopColumn().references(() => shop.id),
		code: text('code').notNull(),
		what: text('what', { enum: WHAT }).notNull(),
		mintedAt: time('minted_at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.code] }),
		index('tag_blank')
			.on(t.shopId, t.mintedAt, t.code)
			.where(sql`what = 'blank'`),
		check('tag_what', sql`${t.what} in (${words(WHAT)})`),
		check('tag_code', sql`${t.code} ~ '^[0-9A-HJKMNP-TV-Z]{5}$'`)
	]
);

/** How often somebody who is no member scanned of late, by a print of the address they came from. */
export const strangerScan = pgTable(
	'stranger_scan',
	{
		came: text('came').primaryKey(),
		scans: integer('scans').notNull(),
		until: time('until').notNull()
	},
	(t) => [index('stranger_scan_until').on(t.until)]
);
