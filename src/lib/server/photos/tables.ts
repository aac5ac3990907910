import { integer, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { idColumn, shopColumn, time } from '../db/columns';
import { shop } from '../people/tables';

/** A cleaned picture in the store: its keys are fresh, its sizes known, its metadata gone. */
export const photo = pgTable(
	'photo',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		key: text('key').notNull().unique(),
		width: integer('width').notNull(),
		height: integer('height').notNull(),
		bytes: integer('bytes').notNull(),
		/** A dozen points of it as a tiny picture, in base64: shown while the real one is on its way. */
		blur: text('blur').notNull().default(''),
		takenAt: time('taken_at').notNull(),
		deletedAt: time('deleted_at')
	},
	(t) => [primaryKey({ columns: [t.shopId, t.id] })]
);
