import { sql } from 'drizzle-orm';
import {
	boolean,
	check,
	date,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time } from '../db/columns';
import { member, shop } from '../people/tables';

/** What a new part costs: for a number, or for a kind on an engine. Money is in the shop's currency. */
export const price = pgTable(
	'price',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		kind: text('kind').notNull(),
		engine: text('engine').notNull().default(''),
		engineKey: text('engine_key').notNull().default(''),
		number: text('number').notNull().default(''),
		numberKey: text('number_key').notNull().default(''),
		newCents: integer('new_cents').notNull(),
		copyCents: integer('copy_cents'),
		source: text('source').notNull(),
		seenOn: date('seen_on', { mode: 'string' }).notNull(),
		version: integer('version').notNull().default(1),
		changedAt: time('changed_at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('price_of').on(t.shopId, t.kind, t.engineKey, t.numberKey),
		index('price_number').on(t.shopId, t.numberKey),
		check('price_new', sql`${t.newCents} > 0`),
		check('price_copy', sql`${t.copyCents} > 0`),
		check('price_for', sql`${t.engineKey} <> '' or ${t.numberKey} <> ''`)
	]
);

/** One number is replaced by another. The new one serves for the old; the old for the new only both ways. */
export const supersession = pgTable(
	'supersession',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		oldNumber: text('old_number').notNull(),
		oldKey: text('old_key').notNull(),
		newNumber: text('new_number').notNull(),
		newKey: text('new_key').notNull(),
		bothWays: boolean('both_ways').notNull().default(false),
		note: text('note').notNull().default(''),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('supersession_of').on(t.shopId, t.oldKey, t.newKey),
		index('supersession_new').on(t.shopId, t.newKey),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check(
			'supersession_keys',
			sql`${t.oldKey} <> '' and ${t.newKey} <> '' and ${t.oldKey} <> ${t.newKey}`
		)
	]
);
