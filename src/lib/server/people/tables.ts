import { ROLES } from '../../people/role';
import { SEASONS, UNITS } from '../../people/settings';
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
import { idColumn, refColumn, shopColumn, time, words } from '../db/columns';

/** Somebody who signs in. Belongs to no shop; a member row ties a person to one. */
export const person = pgTable(
	'person',
	{
		id: text('id')
			.primaryKey()
			.$defaultFn(() => crypto.randomUUID()),
		name: text('name'),
		email: text('email').notNull().unique(),
		emailVerified: time('email_verified'),
		image: text('image')
	},
	(t) => [check('person_email_lower', sql`${t.email} = lower(${t.email})`)]
);

export const account = pgTable(
	'account',
	{
		userId: text('user_id')
			.notNull()
			.references(() => person.id, { onDelete: 'cascade' }),
		type: text('type').$type<'email' | 'oauth' | 'oidc' | 'webauthn'>().notNull(),
		provider: text('provider').notNull(),
		providerAccountId: text('provider_account_id').notNull(),
		refresh_token: text('refresh_token'),
		access_token: text('access_token'),
		expires_at: integer('expires_at'),
		token_type: text('token_type'),
		scope: text('scope'),
		id_token: text('id_token'),
		session_state: text('session_state')
	},
	(t) => [primaryKey({ columns: [t.provider, t.providerAccountId] })]
);

export const session = pgTable(
	'session',
	{
		sessionToken: text('session_token').primaryKey(),
		userId: text('user_id')
			.notNull()
			.references(() => person.id, { onDelete: 'cascade' }),
		expires: time('expires').notNull()
	},
	(t) => [index('session_user').on(t.userId)]
);

export const verificationToken = pgTable(
	'verification_token',
	{
		identifier: text('identifier').notNull(),
		token: text('token').notNull(),
		expires: time('expires').notNull()
	},
	(t) => [primaryKey({ columns: [t.identifier, t.token] })]
);

/** The argon2id hash, apart from the person so that no session ever carries it. */
export const passwordHash = pgTable('password_hash', {
	personId: text('person_id')
		.primaryKey()
		.references(() => person.id, { onDelete: 'cascade' }),
	hash: text('hash').notNull(),
	changedAt: time('changed_at').notNull()
});

/** Wrong tries in a row for an address, known or not, and when the next one counts. */
export const signInTry = pgTable('sign_in_try', {
	email: text('email').primaryKey(),
	failures: integer('failures').notNull(),
	waitUntil: time('wait_until').notNull()
});

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

/** One answered change: the same key and body again gets the same answer and does nothing. */
export const answered = pgTable(
	'answered',
	{
		shopId: shopColumn().references(() => shop.id),
		key: text('key').notNull(),
		memberId: refColumn('member_id').notNull(),
		bodyHash: text('body_hash').notNull(),
		answer: jsonb('answer'),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.memberId, t.key] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] })
	]
);

/** Who did what to which thing, when. Only ever appended to. */
export const event = pgTable(
	'event',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		at: time('at').notNull(),
		memberId: refColumn('member_id').notNull(),
		about: text('about').notNull(),
		aboutId: refColumn('about_id').notNull(),
		what: text('what').notNull(),
		fromState: text('from_state'),
		toState: text('to_state'),
		detail: jsonb('detail').$type<Record<string, unknown>>().notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('event_about').on(t.shopId, t.about, t.aboutId, t.id),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] })
	]
);
