import { OUTCOMES, WALKS } from '../../walks/words';
import { sql } from 'drizzle-orm';
import {
	check,
	foreignKey,
	index,
	integer,
	pgTable,
	primaryKey,
	text,
	uniqueIndex
} from 'drizzle-orm/pg-core';
import { bin } from '../bins/tables';
import { idColumn, refColumn, shopColumn, time, words } from '../db/columns';
import { part } from '../parts/tables';
import { member, shop } from '../people/tables';

/** A round through the bins. Its stops are rows, so that another phone goes on where one left off. */
export const walk = pgTable(
	'walk',
	{
		shopId: shopColumn().references(() => shop.id),
		id: idColumn(),
		what: text('what', { enum: WALKS }).notNull(),
		startedBy: refColumn('started_by').notNull(),
		startedAt: time('started_at').notNull(),
		endedAt: time('ended_at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.id] }),
		index('walk_open').on(t.shopId, t.endedAt),
		foreignKey({ columns: [t.shopId, t.startedBy], foreignColumns: [member.shopId, member.id] }),
		check('walk_what', sql`${t.what} in (${words(WALKS)})`)
	]
);

/** One thing to do at one place: a part to look for, or a bin in which nothing should lie. */
export const walkStop = pgTable(
	'walk_stop',
	{
		shopId: shopColumn().references(() => shop.id),
		walkId: refColumn('walk_id').notNull(),
		/** Its place in the route; what turned up on the way comes after. */
		n: integer('n').notNull(),
		binId: refColumn('bin_id'),
		partId: refColumn('part_id'),
		/** Why the part is on the list. */
		why: text('why').notNull().default(''),
		outcome: text('outcome', { enum: OUTCOMES }),
		/** Where it was put, or what was said of it. */
		note: text('note').notNull().default(''),
		/** The event of the part that the answer made; undone with it. */
		eventId: refColumn('event_id'),
		memberId: refColumn('member_id'),
		at: time('at')
	},
	(t) => [
		primaryKey({ columns: [t.shopId, t.walkId, t.n] }),
		uniqueIndex('walk_stop_part')
			.on(t.shopId, t.walkId, t.partId)
			.where(sql`${t.partId} is not null and ${t.outcome} is distinct from 'moved here'`),
		index('walk_stop_bin').on(t.shopId, t.binId, t.at),
		index('walk_stop_of_part').on(t.shopId, t.partId),
		foreignKey({ columns: [t.shopId, t.walkId], foreignColumns: [walk.shopId, walk.id] }),
		foreignKey({ columns: [t.shopId, t.binId], foreignColumns: [bin.shopId, bin.id] }),
		foreignKey({ columns: [t.shopId, t.partId], foreignColumns: [part.shopId, part.id] }),
		foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id] }),
		check('walk_stop_outcome', sql`${t.outcome} in (${words(OUTCOMES)})`),
		check('walk_stop_thing', sql`${t.binId} is not null or ${t.partId} is not null`),
		check(
			'walk_stop_said',
			sql`(${t.outcome} is null) = (${t.at} is null) and (${t.outcome} is null) = (${t.memberId} is null)`
		)
	]
);
