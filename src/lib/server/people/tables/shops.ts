import { ROLES } from '../../../people/role';
import { SEASONS, UNITS } from '../../../people/settings';
import { sql } from 'drizzle-orm';
import {
	bigint,
	check,
	foreignKey,
	index,
	integer,
	jsonb,
	pgTable,
	primaryKey,
	text,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time, words } from '../../db/columns';
import { person } from './persons';

export const shop = pgTable(
	'shop',
	{
		id: bigint('id', { mode: 'number' }).primaryKey().generatedByDefaultAsIdentity(),
		slug: text('slug').notNull().unique(),
		name: text('name').notNull(),
		currency: text('currency').notNull(),
		timeZone: text('time_zone').notNull(),
		units: text('units', { enum: UNITS }).notNull(),
		season: text('season', { enum: SEASONS }).notNull(),
		lastDonorNumber: integer('last_donor_number').notNull().default(0),
		lastWantNumber: integer('last_want_number').notNull().default(0),
		lastReleaseNumber: integer('last_release_number').notNull().default(0),
		lastScrapRunNumber: integer('last_scrap_run_number').notNull().default(0),
		version: integer('version').notNull().default(1),
		createdAt: time('created_at').notNull()
	},
	(t) => [
		check('shop_units', sql`${t.units} in (${words(UNITS)})`),
		check('shop_season', sql`${t.season} in (${words(SEASONS)})`)
	]
);

/** The owner's own figures; what is absent follows the defaults. */
export const policy = pgTable('policy', {
	shopId: shopColumn()
		.primaryKey()
		.references(() => shop.id),
	figures: jsonb('figures').notNull(),
	version: integer('version').notNull().default(1),
	changedAt: time('changed_at').notNull()
});

/** A person in a shop; a row without a person stands for a key that scripts use. */
export const member = pgTable(
	'member',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		personId: text('person_id').references(() => person.id),
		name: text('name').notNull(),
		role: text('role', { enum: ROLES }).notNull(),
		disabledAt: time('disabled_at'),
		joinedAt: time('joined_at').notNull(),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('member_once').on(t.shopId, t.personId),
		index('member_person').on(t.personId),
		check('member_role', sql`${t.role} in (${words(ROLES)})`)
	]
);

export const invite = pgTable(
	'invite',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		email: text('email').notNull(),
		role: text('role', { enum: ROLES }).notNull(),
		tokenHash: text('token_hash').notNull().unique(),
		invitedBy: refColumn('invited_by').notNull(),
		sentAt: time('sent_at').notNull(),
		expiresAt: time('expires_at').notNull(),
		acceptedAt: time('accepted_at'),
		withdrawnAt: time('withdrawn_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		foreignKey({ columns: [t.shopId, t.invitedBy], foreignColumns: [member.shopId, member.id] })
	]
);

export const apiKey = pgTable(
	'api_key',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		memberId: refColumn('member_id').notNull(),
		tokenHash: text('token_hash').notNull().unique(),
		createdAt: time('created_at').notNull(),
		revokedAt: time('revoked_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] })
	]
);
