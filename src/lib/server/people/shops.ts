import type { Role } from '$lib/people/role';
import { sql } from 'drizzle-orm';
import type { Db } from '../db';
import { tokenHash } from './hash';

export interface Membership {
	shopId: number;
	slug: string;
	name: string;
	memberId: number;
	role: Role;
}

/** The shops that a person may enter, read anew on each request: a disabled member is out at once. */
export async function shopsOf(db: Db, personId: string): Promise<Membership[]> {
	const { rows } = await db.execute<{
		shop_id: string;
		slug: string;
		name: string;
		member_id: string;
		role: Role;
		disabled: boolean;
	}>(sql`select * from shops_of(${personId})`);
	return rows
		.filter((row) => !row.disabled)
		.map((row) => ({
			shopId: Number(row.shop_id),
			slug: row.slug,
			name: row.name,
			memberId: Number(row.member_id),
			role: row.role
		}));
}

/** The shop and role that a script's key carries, or null. */
export async function keyHolder(db: Db, key: string): Promise<Omit<Membership, 'name'> | null> {
	const { rows } = await db.$client.query<{
		shop_id: string;
		slug: string;
		member_id: string;
		role: Role;
	}>({
		name: 'key holder',
		text: 'select * from key_holder($1)',
		values: [tokenHash(key)]
	});
	const row = rows[0];
	return row
		? {
				shopId: Number(row.shop_id),
				slug: row.slug,
				memberId: Number(row.member_id),
				role: row.role
			}
		: null;
}

export async function allShopIds(db: Db): Promise<number[]> {
	const { rows } = await db.execute<{ all_shop_ids: string }>(sql`select all_shop_ids()`);
	return rows.map((row) => Number(row.all_shop_ids));
}
