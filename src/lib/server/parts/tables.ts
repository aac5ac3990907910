import { GRADES, PART_STATES, PROOFS } from '../../parts/words';
import type { ProofFigure } from '../../parts/view';
import { sql } from 'drizzle-orm';
import {
	boolean,
	check,
	doublePrecision,
	foreignKey,
	index,
	integer,
	jsonb,
	pgTable,
	primaryKey,
	text,
	unique
} from 'drizzle-orm/pg-core';
import { bin } from '../bins/tables';
import { emptyArray, idColumn, refColumn, shopColumn, textArray, time, words } from '../db/columns';
import { box, donor } from '../donors/tables';
import { member, shop } from '../people/tables';
import { photo } from '../photos/tables';
import { tag } from '../tags/tables';

export * from './tables/left-on';

/** One physical part. Without a donor it is old stock and says itself which engine it fits. */
export const part = pgTable(
	'part',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		tag: text('tag').notNull(),
		kind: text('kind').notNull(),
		donorId: refColumn('donor_id'),
		engine: text('engine').notNull().default(''),
		engineKey: text('engine_key').notNull().default(''),
		grade: text('grade', { enum: GRADES }).notNull(),
		state: text('state', { enum: PART_STATES }).notNull(),
		binId: refColumn('bin_id'),
		boxId: refColumn('box_id'),
		label: text('label').notNull().default(''),
		numbers: textArray('numbers').notNull().default(emptyArray),
		numberKeys: textArray('number_keys').notNull().default(emptyArray),
		set: text('hardware_set').notNull().default(''),
		setMissing: text('set_missing').notNull().default(''),
		checklist: textArray('checklist').notNull().default(emptyArray),
		massGrams: integer('mass_grams'),
		note: text('note').notNull().default(''),
		heldFor: text('held_for'),
		heldUntil: time('held_until'),
		outAs: text('out_as', { enum: ['fitted', 'sold'] }),
		outTo: text('out_to'),
		outCents: integer('out_cents'),
		scrapReason: text('scrap_reason'),
		destroyed: boolean('destroyed').notNull().default(false),
		searchWords: text('search_words').notNull().default(''),
		pulledAt: time('pulled_at').notNull(),
		changedAt: time('changed_at').notNull(),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('part_tag').on(t.shopId, t.tag),
		index('part_kind').on(t.shopId, t.kind, t.state),
		index('part_engine').on(t.shopId, t.kind, t.engineKey),
		index('part_donor').on(t.shopId, t.donorId),
		index('part_bin').on(t.shopId, t.binId),
		index('part_numbers').using('gin', t.numberKeys),
		foreignKey({ columns: [t.shopId, t.tag], foreignColumns: [tag.shopId, tag.code] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.binId], foreignColumns: [bin.shopId, bin.id] }),
		foreignKey({ columns: [t.shopId, t.boxId], foreignColumns: [box.shopId, box.id] }),
		check('part_grade', sql`${t.grade} in (${words(GRADES)})`),
		check('part_state', sql`${t.state} in (${words(PART_STATES)})`),
		check('part_one_place', sql`${t.binId} is null or ${t.boxId} is null`),
		check('part_held', sql`(${t.state} = 'held') = (${t.heldFor} is not null)`),
		check('part_out', sql`(${t.state} = 'out') = (${t.outAs} is not null)`),
		check('part_scrapped', sql`(${t.state} = 'scrapped') = (${t.scrapReason} is not null)`),
		check('part_mass', sql`${t.massGrams} > 0`)
	]
);

/** How a part was checked, by whom and when; stays with the part for life. */
export const proof = pgTable(
	'proof',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		partId: refColumn('part_id').notNull(),
		how: text('how', { enum: PROOFS }).notNull(),
		figure: doublePrecision('figure'),
		unit: text('unit').notNull().default(''),
		/** What else was read, each by the name of its field. */
		figures: jsonb('figures').$type<ProofFigure[]>().notNull().default([]),
		note: text('note').notNull().default(''),
		passed: boolean('passed').notNull(),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('proof_part').on(t.shopId, t.partId),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('proof_how', sql`${t.how} in (${words(PROOFS)})`)
	]
);

export const partPhoto = pgTable(
	'part_photo',
	{
		shopId: shopColumn().references(() => shop.id),
		partId: refColumn('part_id').notNull(),
		photoId: refColumn('photo_id').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.partId, t.photoId] }),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({
			columns: [t.shopId, t.photoId],
			foreignColumns: [photo.shopId, photo.id]
		}).onDelete('cascade')
	]
);

/** Somebody tried a part of a kind, off one engine, on another: it fits, or it does not and why. */
export const fit = pgTable(
	'fit',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		partId: refColumn('part_id').notNull(),
		kind: text('kind').notNull(),
		/** The engine that the part is from. */
		fromKey: text('from_key').notNull(),
		/** The engine it was tried on. */
		engine: text('engine').notNull(),
		engineKey: text('engine_key').notNull(),
		fits: boolean('fits').notNull(),
		because: text('because').notNull().default(''),
		bothWays: boolean('both_ways').notNull(),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('fit_kind').on(t.shopId, t.kind),
		index('fit_part').on(t.shopId, t.partId),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('fit_engine', sql`${t.engineKey} <> ''`),
		check('fit_because', sql`${t.fits} or ${t.because} <> ''`)
	]
);

export * from './tables/pins';
