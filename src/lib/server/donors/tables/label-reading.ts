import { sql } from 'drizzle-orm';
import {
	check,
	doublePrecision,
	foreignKey,
	index,
	jsonb,
	pgTable,
	primaryKey,
	text
} from 'drizzle-orm/pg-core';
import { READING_STATES } from '../../../donors/reading-words';
import type { SeenWord } from '../../../photos/seen';
import { idColumn, refColumn, shopColumn, time, words } from '../../db/columns';
import { member, shop } from '../../people/tables';
import { donor, donorPhoto } from '../tables';

/** What was read off a photo of a donor's plate: every word of every look, as it was read. */
export const labelReading = pgTable(
	'label_reading',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		donorId: refColumn('donor_id').notNull(),
		photoId: refColumn('photo_id').notNull(),
		memberId: refColumn('member_id').notNull(),
		askedAt: time('asked_at').notNull(),
		state: text('state', { enum: READING_STATES }).notNull(),
		readAt: time('read_at'),
		/** The photo turned clockwise by so many degrees is how it was read. */
		turn: doublePrecision('turn').notNull().default(0),
		looks: jsonb('looks').$type<SeenWord[][]>().notNull().default([])
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('label_reading_donor').on(t.shopId, t.donorId, t.id),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({
			columns: [t.shopId, t.donorId, t.photoId],
			foreignColumns: [donorPhoto.shopId, donorPhoto.donorId, donorPhoto.photoId]
		}).onDelete('cascade'),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('label_reading_state', sql`${t.state} in (${words(READING_STATES)})`)
	]
);
