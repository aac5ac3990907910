import { sql } from 'drizzle-orm';
import {
	check,
	date,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	unique
} from 'drizzle-orm/pg-core';
import { WASTE_WAYS, WASTES } from '../../yard/words';
import { emptyArray, idColumn, refColumn, shopColumn, textArray, time, words } from '../db/columns';
import { donor } from '../donors/tables';
import { member, shop } from '../people/tables';
import { photo } from '../photos/tables';

/** What is left of a donor once it is stripped. */
export const carcass = pgTable(
	'carcass',
	{
		shopId: shopColumn().references(() => shop.id),
		donorId: refColumn('donor_id').notNull(),
		grams: integer('grams').notNull(),
		scrapClass: text('scrap_class').notNull(),
		drained: textArray('drained').notNull().default(emptyArray),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.donorId] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('carcass_grams', sql`${t.grams} > 0`)
	]
);

/** One trip to the scrap buyer. */
export const scrapRun = pgTable(
	'scrap_run',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		number: integer('number').notNull(),
		on: date('on', { mode: 'string' }).notNull(),
		buyer: text('buyer').notNull(),
		ticket: text('ticket').notNull().default(''),
		photoId: refColumn('photo_id'),
		note: text('note').notNull().default(''),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull(),
		takenBackAt: time('taken_back_at'),
		takenBackBecause: text('taken_back_because')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('scrap_run_number').on(t.shopId, t.number),
		foreignKey({ columns: [t.shopId, t.photoId], foreignColumns: [photo.shopId, photo.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('scrap_run_taken_back', sql`(${t.takenBackAt} is null) = (${t.takenBackBecause} is null)`)
	]
);

/** What one class of scrap weighed and brought on a run. */
export const scrapLoad = pgTable(
	'scrap_load',
	{
		shopId: shopColumn().references(() => shop.id),
		runId: refColumn('run_id').notNull(),
		scrapClass: text('scrap_class').notNull(),
		grams: integer('grams').notNull(),
		cents: integer('cents').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.runId, t.scrapClass] }),
		foreignKey({ columns: [t.shopId, t.runId], foreignColumns: [scrapRun.shopId, scrapRun.id] }),
		check('scrap_load_figures', sql`${t.grams} > 0 and ${t.cents} >= 0`)
	]
);

/** The donors that a run closed. */
export const scrapRunDonor = pgTable(
	'scrap_run_donor',
	{
		shopId: shopColumn().references(() => shop.id),
		runId: refColumn('run_id').notNull(),
		donorId: refColumn('donor_id').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.runId, t.donorId] }),
		index('scrap_run_donor_donor').on(t.shopId, t.donorId),
		foreignKey({ columns: [t.shopId, t.runId], foreignColumns: [scrapRun.shopId, scrapRun.id] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] })
	]
);

/** Used oil, old fuel and the like: what went into the cans and who took it away. Added to, never changed. */
export const waste = pgTable(
	'waste',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		what: text('what', { enum: WASTES }).notNull(),
		way: text('way', { enum: WASTE_WAYS }).notNull(),
		millilitres: integer('millilitres').notNull(),
		on: date('on', { mode: 'string' }).notNull(),
		/** Who took it away. */
		who: text('who').notNull().default(''),
		ticket: text('ticket').notNull().default(''),
		note: text('note').notNull().default(''),
		/** The entry that this one puts right, by taking it out again. */
		correctsId: refColumn('corrects_id'),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('waste_corrected_once').on(t.shopId, t.correctsId),
		foreignKey({ columns: [t.shopId, t.correctsId], foreignColumns: [t.shopId, t.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('waste_what', sql`${t.what} in (${words(WASTES)})`),
		check('waste_way', sql`${t.way} in (${words(WASTE_WAYS)})`),
		check('waste_amount', sql`${t.millilitres} > 0`)
	]
);
