import { foreignKey, pgTable, primaryKey, text } from 'drizzle-orm/pg-core';
import { refColumn, shopColumn, time } from '../../db/columns';
import { donor } from '../../donors/tables';
import { member, shop } from '../../people/tables';

/** A kind that somebody at the bench decided to leave on its donor. */
export const leftOn = pgTable(
	'left_on',
	{
		shopId: shopColumn().references(() => shop.id),
		donorId: refColumn('donor_id').notNull(),
		kind: text('kind').notNull(),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull()
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.donorId, t.kind] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] })
	]
);
