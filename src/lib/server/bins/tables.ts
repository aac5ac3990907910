import { BIN_SIZES } from '../../bins/size';
import { BIN_USES, type BinUse } from '../../bins/use';
import { sql } from 'drizzle-orm';
import {
	boolean,
	check,
	doublePrecision,
	foreignKey,
	integer,
	pgTable,
	primaryKey,
	text,
	unique,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { emptyArray, idColumn, shopColumn, textArray, time, words } from '../db/columns';
import { shop } from '../people/tables';
import { tag } from '../tags/tables';

export const bin = pgTable(
	'bin',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		tag: text('tag').notNull(),
		address: text('address').notNull(),
		rack: text('rack'),
		shelf: integer('shelf'),
		slot: integer('slot'),
		size: text('size', { enum: BIN_SIZES }).notNull(),
		litres: doublePrecision('litres'),
		/** What it may carry, all together. */
		loadKg: doublePrecision('load_kg'),
		yearlyCostCents: integer('yearly_cost_cents'),
		uses: textArray('uses').$type<BinUse[]>().notNull().default(emptyArray),
		/** The kinds that are named for it. */
		kinds: textArray('kinds').notNull().default(emptyArray),
		purpose: text('purpose').notNull().default(''),
		place: text('place').notNull().default(''),
		red: boolean('red').notNull().default(false),
		retiredAt: time('retired_at'),
		version: integer('version').notNull().default(1),
		createdAt: time('created_at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('bin_tag').on(t.shopId, t.tag),
		uniqueIndex('bin_address')
			.on(t.shopId, sql`upper(${t.address})`)
			.where(sql`${t.retiredAt} is null`),
		foreignKey({ columns: [t.shopId, t.tag], foreignColumns: [tag.shopId, tag.code] }),
		check('bin_size', sql`${t.size} in (${words(BIN_SIZES)})`),
		check('bin_litres', sql`${t.litres} > 0`),
		check('bin_load', sql`${t.loadKg} > 0`),
		check('bin_uses', sql`${t.uses} <@ array[${words(BIN_USES)}]`),
		check('bin_cost', sql`${t.yearlyCostCents} >= 0`)
	]
);
