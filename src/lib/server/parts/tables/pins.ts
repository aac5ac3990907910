import { sql } from 'drizzle-orm';
import {
	check,
	doublePrecision,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { idColumn, refColumn, shopColumn, time } from '../../db/columns';
import { donorPhoto } from '../../donors/tables';
import { member, shop } from '../../people/tables';
import { part } from '../tables';

/** A numbered pin on a donor's photo: this is that part, or a kind still to be pulled. x and y run from 0 to 1. */
export const pin = pgTable(
	'pin',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		donorId: refColumn('donor_id').notNull(),
		photoId: refColumn('photo_id').notNull(),
		n: integer('n').notNull(),
		x: doublePrecision('x').notNull(),
		y: doublePrecision('y').notNull(),
		kind: text('kind').notNull(),
		partId: refColumn('part_id'),
		removedAt: time('removed_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		uniqueIndex('pin_number')
			.on(t.shopId, t.photoId, t.n)
			.where(sql`removed_at is null`),
		index('pin_donor').on(t.shopId, t.donorId, t.kind),
		index('pin_part').on(t.shopId, t.partId),
		foreignKey({
			columns: [t.shopId, t.donorId, t.photoId],
			foreignColumns: [donorPhoto.shopId, donorPhoto.donorId, donorPhoto.photoId]
		}).onDelete('cascade'),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		check('pin_on_photo', sql`${t.x} between 0 and 1 and ${t.y} between 0 and 1 and ${t.n} > 0`)
	]
);

/** Two points of a photo that lie a known length apart: the photo's scale. */
export const ruler = pgTable(
	'ruler',
	{
		shopId: shopColumn().references(() => shop.id),
		photoId: refColumn('photo_id').notNull(),
		donorId: refColumn('donor_id').notNull(),
		x1: doublePrecision('x1').notNull(),
		y1: doublePrecision('y1').notNull(),
		x2: doublePrecision('x2').notNull(),
		y2: doublePrecision('y2').notNull(),
		mm: doublePrecision('mm').notNull(),
		/** The length as somebody typed it. */
		said: text('said').notNull(),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.photoId] }),
		foreignKey({
			columns: [t.shopId, t.donorId, t.photoId],
			foreignColumns: [donorPhoto.shopId, donorPhoto.donorId, donorPhoto.photoId]
		}).onDelete('cascade'),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('ruler_mm', sql`${t.mm} > 0`)
	]
);
