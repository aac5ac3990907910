import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { inShop, type Context } from '../../src/lib/server/context';
import { openDb, type Db, type Tx } from '../../src/lib/server/db';
import { listDonors } from '../../src/lib/server/donors';
import { event } from '../../src/lib/server/people/tables';
import { testShops } from '../support/shops';
import { stock } from '../support/things';

const REQUESTS = 1000;
const ABORTED = 'the visitor went away';

let narrow: Db;
let shops: Context[];
beforeAll(async () => {
	const { ours, theirs } = await testShops();
	await stock(ours);
	await stock(theirs);
	narrow = openDb(process.env.DATABASE_URL!, 2);
	shops = [ours.ctx, theirs.ctx].map((ctx) => ({ ...ctx, db: narrow }));
});
afterAll(() => narrow.$client.end());

/** What a request may do: read, fail in the database, give up half-way; never asking for its shop itself. */
const requests: ((tx: Tx) => Promise<unknown>)[] = [
	(tx) => tx.select().from(event),
	(tx) => tx.execute(sql`select 1 / 0`),
	(tx) => tx.select().from(event),
	(tx) =>
		tx
			.select()
			.from(event)
			.then(() => Promise.reject(new Error(ABORTED)))
];

type Enter = (ctx: Context, work: (tx: Tx) => Promise<unknown>) => Promise<unknown>;

/** Sends requests of both shops through two connections. Returns how many foreign rows were seen, and errors. */
async function interleave(enter: Enter) {
	let foreign = 0;
	let errors = 0;
	let rows = 0;
	const one = async (i: number) => {
		const ctx = shops[i % 2]!;
		const work = requests[(i >> 1) % requests.length]!;
		const seen = (await enter(ctx, work).catch(() => errors++)) as { shopId: number }[] | number;
		if (typeof seen === 'number') return;
		rows += seen.length;
		foreign += seen.filter((row) => row.shopId !== ctx.shopId).length;
	};
	await Promise.all(Array.from({ length: REQUESTS }, (_, i) => one(i)));
	return { foreign, errors, rows };
}

const leftOver = async () => {
	const asked = [0, 1].map(() =>
		narrow.execute<{ shop: string }>(sql`select current_shop() as shop`)
	);
	return (await Promise.all(asked)).map(({ rows }) => rows[0]!.shop);
};

it('a thousand requests of two shops over two connections see nothing of each other', async () => {
	const { foreign, errors, rows } = await interleave((ctx, work) => inShop(ctx, (tx) => work(tx)));
	expect(foreign).toBe(0);
	expect(errors).toBe(REQUESTS / 2);
	expect(rows).toBeGreaterThan(REQUESTS);
	expect(await leftOver()).toEqual([null, null]);
	for (const ctx of shops) expect((await listDonors(ctx)).items).toHaveLength(1);
});

it('where the shop is set for the connection they do: the test can fail', async () => {
	const careless: Enter = async (ctx, work) => {
		await narrow.execute(sql`select set_config('endplay.shop', ${String(ctx.shopId)}, false)`);
		return narrow.transaction(work);
	};
	expect((await interleave(careless)).foreign).toBeGreaterThan(0);
	expect(await leftOver()).not.toEqual([null, null]);
});
