import { foreignKey, integer, jsonb, pgTable, primaryKey } from 'drizzle-orm/pg-core';
import type { TriageAnswers } from '../../../trade/triage';
import { refColumn, shopColumn, time } from '../../db/columns';
import { member, shop } from '../../people/tables';
import { donor } from '../tables';

/** What was found when an electrical thing was tried before the engine was opened. */
export interface InPlace {
	passed: boolean;
	figure: number | null;
	unit: string;
}

/** What the first minute at the tailgate showed, and what was tried in place. */
export const triage = pgTable(
	'triage',
	{
		shopId: shopColumn().references(() => shop.id),
		donorId: refColumn('donor_id').notNull(),
		answers: jsonb('answers').$type<TriageAnswers>().notNull(),
		/** By kind. */
		inPlace: jsonb('in_place').$type<Record<string, InPlace>>().notNull(),
		memberId: refColumn('member_id').notNull(),
		at: time('at').notNull(),
		version: integer('version').notNull().default(1)
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.donorId] }),
		foreignKey({ columns: [t.shopId, t.donorId], foreignColumns: [donor.shopId, donor.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] })
	]
);
