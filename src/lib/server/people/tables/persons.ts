import { sql } from 'drizzle-orm';
import { check, index, integer, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { time } from '../../db/columns';

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
