import { foreignKey, index, json, jsonb, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time } from '../../db/columns';
import { member, shop } from './shops';

/** One answered change: the same key and body again gets the same answer and does nothing. */
export const answered = pgTable(
	'answered',
	{
		shopId: shopColumn().references(() => shop.id),
		key: text('key').notNull(),
		memberId: refColumn('member_id').notNull(),
		bodyHash: text('body_hash').notNull(),
		/** As it was said, to the letter. */
		answer: json('answer'),
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
