import { DONOR_SHOTS, DONOR_STATES, RELEASE_ROUTES, SHAFTS, SURENESS } from '../../donors/words';
import { sql } from 'drizzle-orm';
import {
	boolean,
	check,
	date,
	doublePrecision,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	unique,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { emptyArray, idColumn, refColumn, shopColumn, textArray, time, words } from '../db/columns';
import { member, shop } from '../people/tables';
import { photo } from '../photos/tables';
import { tag } from '../tags/tables';

export * from './tables/label-reading';
export * from './tables/triage';

export const donor = pgTable(
	'donor',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		number: integer('number').notNull(),
		maker: text('maker').notNull().default(''),
		model: text('model').notNull().default(''),
		engineKey: text('engine_key').notNull().default(''),
		typeCode: text('type_code').notNull().default(''),
		dateCode: text('date_code').notNull().default(''),
		serial: text('serial').notNull().default(''),
		emissionFamily: text('emission_family').notNull().default(''),
		displacementCc: doublePrecision('displacement_cc'),
		shaft: text('shaft', { enum: SHAFTS }),
		engineClass: text('engine_class'),
		fittings: textArray('fittings').notNull().default(emptyArray),
		offMachine: text('off_machine').notNull().default(''),
		searchWords: text('search_words').notNull().default(''),
		serialKey: text('serial_key').generatedAlwaysAs(
			sql`translate(regexp_replace(upper(serial), '[^0-9A-Z]', '', 'g'), 'OI', '01')`
		),
		cause: text('cause'),
		secondCause: text('second_cause'),
		sureness: text('sureness', { enum: SURENESS }),
		safeTicks: textArray('safe_ticks').notNull().default(emptyArray),
		paidCents: integer('paid_cents').notNull().default(0),
		note: text('note').notNull().default(''),
		state: text('state', { enum: DONOR_STATES }).notNull(),
		/** The owner passed the release that stands with a reason; a newer release is asked again. */
		gateOverruled: boolean('gate_overruled').notNull().default(false),
		/** A parked one is looked at again by this day. */
		reviewOn: date('review_on', { mode: 'string' }),
		takenInAt: time('taken_in_at').notNull(),
		strippedAt: time('stripped_at'),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('donor_number').on(t.shopId, t.number),
		index('donor_engine').on(t.shopId, t.engineKey),
		index('donor_serial').on(t.shopId, t.serialKey, t.id),
		index('donor_open')
			.on(t.shopId, t.engineClass, t.id)
			.where(sql`state in ('whole', 'on the bench', 'parked')`),
		check('donor_state', sql`${t.state} in (${words(DONOR_STATES)})`),
		check('donor_sureness', sql`${t.sureness} in (${words(SURENESS)})`),
		check('donor_shaft', sql`${t.shaft} in (${words(SHAFTS)})`),
		check('donor_paid', sql`${t.paidCents} >= 0`)
	]
);

/** The record that the shop may take it apart. The newest row stands; older ones stay readable. */
export const release = pgTable(
	'release',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		/** Consecutive in the shop's register. */
		number: integer('number').notNull().default(0),
		donorId: refColumn('donor_id').notNull(),
		route: text('route', { enum: RELEASE_ROUTES }).notNull(),
		document: text('document').notNull().default(''),
		/** What the donor was taken for on that day; a later correction of the donor leaves the book as it is. */
		engine: text('engine').notNull().default(''),
		serial: text('serial').notNull().default(''),
		fromName: text('from_name').notNull().default(''),
		fromAddress: text('from_address').notNull().default(''),
		/** What showed who they are, never its number in full. */
		idSeen: text('id_seen').notNull().default(''),
		/** What was signed, word for word, and the picture of the signature or of the signed paper. */
		signedWords: text('signed_words').notNull().default(''),
		photoId: refColumn('photo_id'),
		/** Why a newer entry was needed. */
		because: text('because').notNull().default(''),
		on: date('on', { mode: 'string' }).notNull(),
		holdUntil: date('hold_until', { mode: 'string' }),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('release_donor').on(t.shopId, t.donorId),
		uniqueIndex('release_number')
			.on(t.shopId, t.number)
			.where(sql`number > 0`),
		foreignKey({ columns: [t.shopId, t.photoId], foreignColumns: [photo.shopId, photo.id] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('release_route', sql`${t.route} in (${words(RELEASE_ROUTES)})`)
	]
);

/** The physical box of a donor. */
export const box = pgTable(
	'box',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		donorId: refColumn('donor_id').notNull(),
		tag: text('tag').notNull(),
		createdAt: time('created_at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('box_tag').on(t.shopId, t.tag),
		index('box_donor').on(t.shopId, t.donorId),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.tag], foreignColumns: [tag.shopId, tag.code] })
	]
);

export const donorPhoto = pgTable(
	'donor_photo',
	{
		shopId: shopColumn().references(() => shop.id),
		donorId: refColumn('donor_id').notNull(),
		photoId: refColumn('photo_id').notNull(),
		shot: text('shot', { enum: DONOR_SHOTS }).notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.donorId, t.photoId] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({
			columns: [t.shopId, t.photoId],
			foreignColumns: [photo.shopId, photo.id]
		}).onDelete('cascade'),
		check('donor_photo_shot', sql`${t.shot} in (${words(DONOR_SHOTS)})`)
	]
);
