import type { OwnMeasures } from '../../labels/stocks';
import { boolean, integer, jsonb, pgTable } from 'drizzle-orm/pg-core';
import { shopColumn, time } from '../db/columns';
import { shop } from '../people/tables';

/** What a shop has said of its labels; without a row everything is as it comes. */
export const labelSettings = pgTable('label_settings', {
	shopId: shopColumn()
		.primaryKey()
		.references(() => shop.id),
	/** The measures of its own sheets, by stock. */
	stocks: jsonb('stocks').$type<OwnMeasures>().notNull(),
	/** Whether a stranger who scans a tag is told whose it is. */
	saysOwner: boolean('says_owner').notNull(),
	version: integer('version').notNull(),
	changedAt: time('changed_at').notNull()
});
