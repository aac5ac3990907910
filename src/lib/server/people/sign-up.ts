import type { SignUp } from '$lib/people/input';
import { sql } from 'drizzle-orm';
import type { Db, Tx } from '../db';
import { addPerson } from './persons';
import { event, member, shop } from './tables';

/** First words of addresses that are no shop. */
const OURS = ['api', 'auth', 'choose-shop', 'invite', 'livez', 'readyz', 'reset', 't', 'theme'];

function slugOf(name: string): string {
	const slug = name
		.normalize('NFKD')
		.toLowerCase()
		.replace(/[^a-z0-9]+/g, '-')
		.replace(/^-|-$/g, '')
		.slice(0, 40)
		.replace(/-$/, '');
	return slug === '' || OURS.includes(slug) || slug.startsWith('sign-')
		? `${slug || 'the'}-shop`
		: slug;
}

export interface NewShop {
	shopName: string;
	currency: string;
	timeZone: string;
	units: 'inch' | 'mm';
}

/** The row of a new shop under the first of its slugs that is free, with its row policies set. */
async function addShop(tx: Tx, input: NewShop & { slug?: string }, now: Date) {
	const { rows } = await tx.execute<{ id: string }>(
		sql`select nextval(pg_get_serial_sequence('shop', 'id')) as id`
	);
	const id = Number(rows[0]!.id);
	await tx.execute(sql`select set_config('endplay.shop', ${String(id)}, true)`);
	const { shopName: name, currency, timeZone, units } = input;
	const wanted = input.slug ?? slugOf(name);
	for (let n = 1; ; n++) {
		const slug = n === 1 ? wanted : `${wanted}-${n}`;
		const row = {
			id,
			slug,
			name,
			currency,
			timeZone,
			units,
			season: 'normal',
			createdAt: now
		} as const;
		const [made] = await tx.insert(shop).values(row).onConflictDoNothing().returning();
		if (made) return { shopId: id, slug };
	}
}

/** Opens a shop with its owner. */
export async function openShop(
	tx: Tx,
	input: NewShop & { slug?: string },
	owner: { personId: string; name: string },
	now: Date
): Promise<{ shopId: number; slug: string; memberId: number }> {
	const { shopId, slug } = await addShop(tx, input, now);
	const [row] = await tx
		.insert(member)
		.values({ shopId, personId: owner.personId, name: owner.name, role: 'owner', joinedAt: now })
		.returning({ id: member.id });
	const memberId = row!.id;
	await tx.insert(event).values({
		shopId,
		at: now,
		memberId,
		about: 'shop',
		aboutId: shopId,
		what: 'opened',
		detail: { name: input.shopName }
	});
	return { shopId, slug, memberId };
}

/** A new shop with a new person as its owner. */
export const signUp = (db: Db, input: SignUp, now: Date): Promise<{ slug: string }> =>
	db.transaction(async (tx) => {
		const who = { name: input.yourName, email: input.email, password: input.password };
		const personId = await addPerson(tx, who, [input.shopName], now);
		return openShop(tx, input, { personId, name: input.yourName }, now);
	});

/** A further shop for somebody who is signed in. */
export const openAnother = (
	db: Db,
	input: NewShop,
	owner: { personId: string; name: string },
	now: Date
): Promise<{ slug: string }> => db.transaction((tx) => openShop(tx, input, owner, now));
