import { NotFound } from '$lib/refusal';
import { sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Db } from '../db';
import { record, tokenHash } from '../people';
import { ownCustomer } from './queries';
import { customer } from './tables';

interface LetterRow extends Record<string, unknown> {
	shop_id: string;
	shop_name: string;
	customer_id: string;
	member_id: string;
	off: boolean;
}

async function letterOf(db: Db, token: string): Promise<LetterRow> {
	const { rows } = await db.execute<LetterRow>(sql`select * from letter_of(${tokenHash(token)})`);
	if (!rows[0]) throw new NotFound('This link is not known. Ask the shop that wrote to you.');
	return rows[0];
}

/** Whose letter carried this link, and whether its letters are stopped. */
export async function findLetter(
	db: Db,
	token: string
): Promise<{ shopName: string; off: boolean }> {
	const { shop_name: shopName, off } = await letterOf(db, token);
	return { shopName, off };
}

/** The reader of the letter decides; it is written under the member whose letter it was. */
async function set(db: Db, token: string, now: Date, off: boolean): Promise<void> {
	const row = await letterOf(db, token);
	if (row.off === off) return;
	const [shopId, memberId, id] = [row.shop_id, row.member_id, row.customer_id].map(Number);
	const ctx: Context = { db, shopId: shopId!, memberId: memberId!, role: 'reader', now };
	await inShop(ctx, async (tx, ctx) => {
		await tx
			.update(customer)
			.set({ lettersOffAt: off ? now : null })
			.where(ownCustomer(ctx, id!));
		const what = off ? 'letters stopped' : 'letters wanted again';
		await record(tx, ctx, { about: 'customer', aboutId: id!, what, detail: { byLink: true } });
	});
}

/** No more letters to whoever got the letter with this link. */
export const stopLetters = (db: Db, token: string, now: Date) => set(db, token, now, true);
export const startLetters = (db: Db, token: string, now: Date) => set(db, token, now, false);
