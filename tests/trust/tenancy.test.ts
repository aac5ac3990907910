import { sql } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { inShop } from '../../src/lib/server/context';
import { testDb, testShops } from '../support/shops';

const tenantTables = async (): Promise<string[]> => {
	const { rows } = await (
		await testDb()
	).execute<{ name: string }>(sql`
		select c.relname as name from pg_class c
		join pg_attribute a on a.attrelid = c.oid and a.attname = 'shop_id' and not a.attisdropped
		where c.relkind = 'r' and c.relnamespace = 'public'::regnamespace order by 1`);
	return rows.map((row) => row.name);
};

describe('the locks between shops', () => {
	it('stand on every table with a shop, for its owner too', async () => {
		const { rows } = await (
			await testDb()
		).execute<{ name: string }>(sql`
			select c.relname as name from pg_class c
			join pg_attribute a on a.attrelid = c.oid and a.attname = 'shop_id'
			where c.relkind = 'r' and c.relnamespace = 'public'::regnamespace
			and not (c.relrowsecurity and c.relforcerowsecurity)`);
		expect(rows).toEqual([]);
		expect((await tenantTables()).length).toBeGreaterThan(15);
	});

	it('hold a role that owns nothing and passes no policy', async () => {
		const db = await testDb();
		const { rows } = await db.execute<Record<string, unknown>>(sql`
			select current_user::text as name, rolsuper, rolbypassrls,
				(select count(*)::int from pg_class where relowner = pg_roles.oid) as owned
			from pg_roles where rolname = current_user`);
		expect(rows[0]).toEqual({
			name: 'endplay_app',
			rolsuper: false,
			rolbypassrls: false,
			owned: 0
		});
	});

	it('answer nothing anywhere while no shop is set', async () => {
		await testShops();
		const db = await testDb();
		for (const table of [...(await tenantTables()), 'shop']) {
			const { rows } = await db.execute(sql`select 1 from ${sql.identifier(table)} limit 1`);
			expect(rows, table).toEqual([]);
		}
	});

	it('show only the own shop when a query forgets to ask for it', async () => {
		const { ours, theirs } = await testShops();
		const seen = await inShop(ours.ctx, async (tx) => {
			const { rows } = await tx.execute<{ shop_id: string }>(
				sql`select distinct shop_id from event`
			);
			return rows.map((row) => Number(row.shop_id));
		});
		expect(seen).toEqual([ours.ctx.shopId]);
		expect(seen).not.toContain(theirs.ctx.shopId);
	});

	it('let nobody write for another shop', async () => {
		const { ours, theirs } = await testShops();
		const write = inShop(ours.ctx, (tx) =>
			tx.execute(
				sql`insert into tag (shop_id, code, what, minted_at) values (${theirs.ctx.shopId}, '0000A', 'bin', now())`
			)
		);
		await expect(write).rejects.toMatchObject({ cause: { code: '42501' } });
	});

	it('are gone with the transaction', async () => {
		const { ours } = await testShops();
		await inShop(ours.ctx, async () => undefined);
		const { rows } = await ours.ctx.db.execute<{ shop: string | null }>(
			sql`select current_shop() as shop`
		);
		expect(rows[0]!.shop).toBeNull();
	});

	it('tie every reference between tables of a shop to the shop', async () => {
		const { rows } = await (
			await testDb()
		).execute<{ name: string; columns: string[] }>(sql`
			select con.conname as name, array_agg(a.attname::text) as columns
			from pg_constraint con
			join pg_attribute a on a.attrelid = con.conrelid and a.attnum = any (con.conkey)
			join pg_attribute target on target.attrelid = con.confrelid and target.attname = 'shop_id'
			where con.contype = 'f' group by 1`);
		expect(rows.length).toBeGreaterThan(15);
		for (const row of rows) expect(row.columns, row.name).toContain('shop_id');
	});

	it('refuse a reference into another shop like one to nothing', async () => {
		const { ours, theirs } = await testShops();
		const pointAt = (memberId: number) =>
			inShop(ours.ctx, (tx) =>
				tx.execute(sql`insert into event (shop_id, at, member_id, about, about_id, what, detail)
					values (${ours.ctx.shopId}, now(), ${memberId}, 'shop', 1, 'x', '{}')`)
			).then(
				() => 'written',
				(fault: Error & { cause?: { code?: string; constraint?: string } }) =>
					`${fault.cause?.code} ${fault.cause?.constraint}`
			);
		expect(await pointAt(theirs.ctx.memberId)).toBe(await pointAt(999_999_999));
		expect(await pointAt(theirs.ctx.memberId)).toContain('23503');
	});

	it('keep what happened from being changed or taken away', async () => {
		const { ours } = await testShops();
		for (const change of [
			sql`update event set what = 'y'`,
			sql`delete from event`,
			sql`delete from tag`
		])
			await expect(inShop(ours.ctx, (tx) => tx.execute(change))).rejects.toMatchObject({
				cause: { code: '42501' }
			});
	});
});
