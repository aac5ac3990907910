import type { Role } from '../../src/lib/people/role';
import type { Context } from '../../src/lib/server/context';
import { openDb, type Db } from '../../src/lib/server/db';
import { inShop } from '../../src/lib/server/context';
import { member } from '../../src/lib/server/people/tables';
import { signUp } from '../../src/lib/server/people/sign-up';
import pg from 'pg';
import { shopsOf } from '../../src/lib/server/people/shops';
import { sql } from 'drizzle-orm';

const need = (name: string): string => {
	const value = process.env[name];
	if (!value) throw new Error(`${name} is not set: run these tests by npm test -- server`);
	return value;
};

let opened: Promise<Db> | undefined;
let counter = 0;

/** A database of this worker's own, cloned from the migrated template. */
async function clone(): Promise<Db> {
	const name = `endplay_w${need('VITEST_POOL_ID')}_${process.pid}`;
	const admin = new pg.Client({ connectionString: need('TEST_ADMIN_URL') });
	await admin.connect();
	await admin.query(`drop database if exists ${name} with (force)`);
	await admin.query(
		`create database ${name} template ${need('TEST_DATABASE_TEMPLATE')} owner endplay_owner`
	);
	await admin.query(`grant connect on database ${name} to endplay_app, endplay_worker`);
	await admin.end();
	process.env.DATABASE_URL = need('TEST_APP_URL').replace('DATABASE', name);
	process.env.DATABASE_WORKER_URL = need('TEST_WORKER_URL').replace('DATABASE', name);
	return openDb(process.env.DATABASE_URL, 24);
}

/** The worker's database as the app's own role sees it. */
export const testDb = (): Promise<Db> => (opened ??= clone());

export interface TestShop {
	slug: string;
	ctx: Context;
	/** The same shop seen by a member of another role. */
	as(role: Role): Promise<Context>;
	/** The same member at another time. */
	at(now: Date): Context;
}

export const NOON = new Date('2026-03-14T12:00:00Z');

async function makeShop(db: Db, name: string): Promise<TestShop> {
	const email = `owner-${process.pid}-${++counter}@shop.example`;
	await signUp(
		db,
		{
			shopName: name,
			yourName: 'Wenna Oke',
			email,
			password: `a long enough phrase ${counter}`,
			currency: 'USD',
			timeZone: 'UTC',
			units: 'inch'
		},
		NOON
	);
	const { rows } = await db.execute<{ id: string }>(
		sql`select id from person where email = ${email}`
	);
	const [here] = await shopsOf(db, rows[0]!.id);
	const ctx: Context = {
		db,
		shopId: here!.shopId,
		memberId: here!.memberId,
		role: 'owner',
		now: NOON
	};
	return {
		slug: here!.slug,
		ctx,
		at: (now) => ({ ...ctx, now }),
		as: (role) =>
			inShop(ctx, async (tx) => {
				const [row] = await tx
					.insert(member)
					.values({ shopId: ctx.shopId, name: `${role} here`, role, joinedAt: NOON })
					.returning({ id: member.id });
				return { ...ctx, role, memberId: row!.id };
			})
	};
}

/** Two new shops side by side: whatever is asked of one, the other must stay unseen. */
export async function testShops(): Promise<{ ours: TestShop; theirs: TestShop }> {
	const db = await testDb();
	return { ours: await makeShop(db, 'Ours'), theirs: await makeShop(db, 'Theirs') };
}
