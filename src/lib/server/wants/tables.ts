import { TELL_BY, WANT_STATES } from '../../wants/words';
import { sql } from 'drizzle-orm';
import {
	check,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	smallint,
	text,
	unique
} from 'drizzle-orm/pg-core';
import { customer } from '../customers/tables';
import { emptyArray, idColumn, refColumn, shopColumn, textArray, time, words } from '../db/columns';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import { member, shop } from '../people/tables';

/** Somebody waits for a part: a customer, a neighbour shop, or a job on the shop's own bench. */
export const want = pgTable(
	'want',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		number: integer('number').notNull(),
		customerId: refColumn('customer_id'),
		job: text('job').notNull().default(''),
		kind: text('kind').notNull().default(''),
		engine: text('engine').notNull().default(''),
		measures: text('measures').notNull().default(''),
		numbers: textArray('numbers').notNull().default(emptyArray),
		numberKeys: textArray('number_keys').notNull().default(emptyArray),
		mostCents: integer('most_cents'),
		note: text('note').notNull().default(''),
		tellBy: text('tell_by', { enum: TELL_BY }).notNull(),
		state: text('state', { enum: WANT_STATES }).notNull(),
		toldBy: text('told_by', { enum: TELL_BY }),
		toldAt: time('told_at'),
		/** The part that is kept for them since they said yes. */
		partId: refColumn('part_id'),
		memberId: refColumn('member_id').notNull(),
		addedAt: time('added_at').notNull(),
		changedAt: time('changed_at').notNull(),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('want_number').on(t.shopId, t.number),
		index('want_open')
			.on(t.shopId, t.kind)
			.where(sql`state in ('waiting', 'told', 'said yes') and part_id is null`),
		index('want_state').on(t.shopId, t.state, t.id),
		index('want_customer').on(t.shopId, t.customerId),
		foreignKey({
			columns: [t.shopId, t.customerId],
			foreignColumns: [customer.shopId, customer.id]
		}),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('want_waiter', sql`(${t.customerId} is null) = (${t.job} <> '')`),
		check('want_what', sql`${t.kind} <> '' or ${t.numberKeys} <> ${emptyArray}`),
		check('want_state', sql`${t.state} in (${words(WANT_STATES)})`),
		check('want_tell_by', sql`${t.tellBy} in (${words(TELL_BY)})`),
		check('want_told', sql`(${t.toldAt} is null) = (${t.toldBy} is null)`),
		check('want_most', sql`${t.mostCents} > 0`)
	]
);

/** A part or a donor that answers a want; one row however often it comes in. */
export const wantMatch = pgTable(
	'want_match',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		wantId: refColumn('want_id').notNull(),
		partId: refColumn('part_id'),
		donorId: refColumn('donor_id'),
		/** 1 by number, 2 by engine, 3 by kind and measures, 4 by kind alone. */
		rank: smallint('rank').notNull(),
		/** When it came in, the last time. */
		at: time('at').notNull(),
		/** Null while nobody at the counter has looked at it. */
		seenAt: time('seen_at'),
		/** Somebody said that it is not the one. */
		droppedAt: time('dropped_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		unique('want_match_part').on(t.shopId, t.wantId, t.partId),
		unique('want_match_donor').on(t.shopId, t.wantId, t.donorId),
		index('want_match_of_part').on(t.shopId, t.partId),
		index('want_match_of_donor').on(t.shopId, t.donorId),
		index('want_match_new')
			.on(t.shopId, t.wantId)
			.where(sql`seen_at is null and dropped_at is null`),
		foreignKey({ columns: [t.shopId, t.wantId], foreignColumns: [want.shopId, want.id] }),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		check('want_match_one', sql`num_nonnulls(${t.partId}, ${t.donorId}) = 1`),
		check('want_match_rank', sql`${t.rank} between 1 and 4`)
	]
);
