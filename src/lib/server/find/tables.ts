import { sql } from 'drizzle-orm';
import {
	bigint,
	check,
	date,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	smallint,
	text,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time } from '../db/columns';
import { part } from '../parts/tables';
import { member, shop } from '../people/tables';

/**
 * One narrow row for each part: what it is found, counted and ordered by. Written by triggers alone, in the
 * transaction of the change; the words are indexed with the shop in front of each.
 */
export const foundBy = pgTable(
	'found_by',
	{
		shopId: shopColumn().references(() => shop.id),
		partId: refColumn('part_id').notNull(),
		kind: text('kind').notNull(),
		/** 0 shelved, pulled, held, back, missing, out, 6 scrapped. */
		stands: smallint('stands').notNull(),
		/** 1 clean used to 5 core. */
		gradeNo: smallint('grade_no').notNull(),
		/** 0 unproved, 1 look-over to 5 bench test hot. */
		proofNo: smallint('proof_no').notNull(),
		binId: refColumn('bin_id'),
		boxId: refColumn('box_id'),
		donorId: refColumn('donor_id'),
		engineKey: text('engine_key').notNull(),
		newCents: integer('new_cents'),
		copyCents: integer('copy_cents'),
		/** The grade that it is priced at; 0 where it never has a price. */
		asksNo: smallint('asks_no').notNull(),
		/** Seconds since 2000 that it was pulled. */
		aged: integer('aged').notNull(),
		/** The same for parts that are the same thing; its own negative number where it is like no other. */
		sameNo: bigint('same_no', { mode: 'bigint' }).notNull(),
		words: text('words').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.partId] }),
		index('found_by_bin').on(t.shopId, t.binId),
		index('found_by_donor').on(t.shopId, t.donorId),
		index('found_by_queue').on(
			...([t.shopId, t.engineKey, t.kind, t.stands, t.gradeNo, t.aged, t.partId, t.binId] as const)
		),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }).onDelete(
			'cascade'
		)
	]
);

/** The numbers of a part as they are compared. */
export const foundNumber = pgTable(
	'found_number',
	{
		shopId: shopColumn().references(() => shop.id),
		key: text('key').notNull(),
		partId: refColumn('part_id').notNull(),
		kind: text('kind').notNull().default(''),
		engineKey: text('engine_key').notNull().default('')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.key, t.partId] }),
		index('found_number_part').on(t.shopId, t.partId),
		index('found_number_like').on(t.shopId, t.key, t.kind, t.engineKey, t.partId),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }).onDelete(
			'cascade'
		)
	]
);

/** Every word that the shop has written about its parts and engines; only added to. */
export const shopWord = pgTable(
	'shop_word',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		word: text('word').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('shop_word_once').on(t.shopId, t.word)
	]
);

/** Somebody looked for a kind and found none: a call, one for each person, kind and day. */
export const asked = pgTable(
	'asked',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		memberId: refColumn('member_id').notNull(),
		kind: text('kind').notNull(),
		on: date('on', { mode: 'string' }).notNull(),
		engine: text('engine').notNull().default(''),
		words: text('words').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('asked_once').on(t.shopId, t.memberId, t.kind, t.on),
		index('asked_kind').on(t.shopId, t.kind, t.on),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('asked_words', sql`${t.words} <> ''`)
	]
);
