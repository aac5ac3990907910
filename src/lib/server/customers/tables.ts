import { CUSTOMER_KINDS, LETTER_STATES } from '../../customers/words';
import { sql } from 'drizzle-orm';
import {
	boolean,
	check,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text
} from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time, words } from '../db/columns';
import { member, shop } from '../people/tables';

/** Somebody whom the shop sells to or asks for; a row whose name and reach are erased stays for the books. */
export const customer = pgTable(
	'customer',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		name: text('name').notNull(),
		kind: text('kind', { enum: CUSTOMER_KINDS }).notNull(),
		phone: text('phone').notNull().default(''),
		/** The digits of the number, as numbers are compared. */
		phoneKey: text('phone_key').notNull().default(''),
		email: text('email').notNull().default(''),
		note: text('note').notNull().default(''),
		/** Name, digits and address as they are looked through. */
		foundBy: text('found_by').notNull(),
		/** Since when no letters are wanted about what they wait for. */
		lettersOffAt: time('letters_off_at'),
		erasedAt: time('erased_at'),
		addedAt: time('added_at').notNull(),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('customer_phone').on(t.shopId, t.phoneKey),
		index('customer_email').on(t.shopId, t.email),
		check('customer_kind', sql`${t.kind} in (${words(CUSTOMER_KINDS)})`),
		check('customer_named', sql`(${t.name} = '') = (${t.erasedAt} is not null)`),
		check(
			'customer_erased',
			sql`${t.erasedAt} is null or (${t.phone} || ${t.phoneKey} || ${t.email} || ${t.note} || ${t.foundBy}) = ''`
		)
	]
);

/** The shop's own words for a letter; a letter without a row is written in the usual ones. */
export const letterTemplate = pgTable(
	'letter_template',
	{
		shopId: shopColumn().references(() => shop.id),
		name: text('name').notNull(),
		subject: text('subject').notNull(),
		text: text('text').notNull(),
		version: integer('version').notNull(),
		changedAt: time('changed_at').notNull()
	},
	(t) => [primaryKey({ columns: [t.shopId, t.name] })]
);

/** How the shop's letters leave; a shop without a row has the usual. */
export const letterSetting = pgTable(
	'letter_setting',
	{
		shopId: shopColumn()
			.primaryKey()
			.references(() => shop.id),
		/** Where answers go; empty: nowhere in particular. */
		replyTo: text('reply_to').notNull().default(''),
		/** Whether those who wait are told without anybody's tap. */
		tellByItself: boolean('tell_by_itself').notNull(),
		/** After so many days told without an answer a want has gone quiet. */
		quietDays: integer('quiet_days').notNull(),
		version: integer('version').notNull(),
		changedAt: time('changed_at').notNull()
	},
	(t) => [check('letter_setting_days', sql`${t.quietDays} between 1 and 365`)]
);

/** A letter to a customer: written with what it tells, sent by the queue. */
export const letter = pgTable(
	'letter',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		customerId: refColumn('customer_id').notNull(),
		about: text('about').notNull(),
		aboutId: refColumn('about_id').notNull(),
		to: text('to').notNull(),
		subject: text('subject').notNull(),
		text: text('text').notNull(),
		/** Of the link by which such letters are stopped; the link itself is in the letter alone. */
		tokenHash: text('token_hash').notNull().unique(),
		state: text('state', { enum: LETTER_STATES }).notNull(),
		tries: integer('tries').notNull().default(0),
		/** Why it did not go, as the mail server said it. */
		fault: text('fault').notNull().default(''),
		memberId: refColumn('member_id').notNull(),
		writtenAt: time('written_at').notNull(),
		sentAt: time('sent_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('letter_about').on(t.shopId, t.about, t.aboutId),
		index('letter_customer').on(t.shopId, t.customerId),
		index('letter_unsent')
			.on(t.shopId, t.id)
			.where(sql`state <> 'sent'`),
		foreignKey({
			columns: [t.shopId, t.customerId],
			foreignColumns: [customer.shopId, customer.id]
		}),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('letter_state', sql`${t.state} in (${words(LETTER_STATES)})`),
		check('letter_sent', sql`(${t.state} = 'sent') = (${t.sentAt} is not null)`)
	]
);
