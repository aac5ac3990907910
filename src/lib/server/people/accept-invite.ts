import type { Role } from '$lib/people/role';
import type { InviteView } from '$lib/people/view';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Db, Tx } from '../db';
import { tokenHash } from './hash';
import { addPerson } from './persons';
import { knowsEmail } from './sign-in';
import { event, invite, member } from './tables';

interface InviteRow extends Record<string, unknown> {
	shop_id: string;
	invite_id: string;
	shop_name: string;
	slug: string;
	email: string;
	role: Role;
	expires_at: Date;
	open: boolean;
}

async function openInvite(db: Db | Tx, token: string, now: Date): Promise<InviteRow> {
	const { rows } = await db.execute<InviteRow>(sql`select * from invite_of(${tokenHash(token)})`);
	const row = rows[0];
	if (!row)
		throw new NotFound('This invitation is not known. Ask the owner of the shop for a new one.');
	if (!row.open || new Date(row.expires_at) < now)
		throw new Refused(
			'gate',
			'This invitation was used or is older than seven days. Ask the owner of the shop for a new one.'
		);
	return row;
}

export async function findInvite(db: Db, token: string, now: Date): Promise<InviteView> {
	const row = await openInvite(db, token, now);
	return {
		shopName: row.shop_name,
		slug: row.slug,
		email: row.email,
		role: row.role,
		known: await knowsEmail(db, row.email)
	};
}

/** Joins the shop: a new person sets a password, a known one must be signed in with the invited address. */
export const acceptInvite = (
	db: Db,
	token: string,
	as: { personId?: string; email?: string; yourName: string; password?: string },
	now: Date
): Promise<{ slug: string }> =>
	db.transaction(async (tx) => {
		const row = await openInvite(tx, token, now);
		if (as.personId && as.email !== row.email)
			throw new Refused(
				'gate',
				`This invitation is for ${row.email}. Sign out and open the link again.`
			);
		const who = { name: as.yourName, email: row.email, password: as.password ?? '' };
		const personId = as.personId ?? (await addPerson(tx, who, [row.shop_name], now));
		await join(tx, row, { personId, name: as.yourName }, now);
		return { slug: row.slug };
	});

async function join(tx: Tx, row: InviteRow, who: { personId: string; name: string }, now: Date) {
	const shopId = Number(row.shop_id);
	await tx.execute(sql`select set_config('endplay.shop', ${row.shop_id}, true)`);
	const [used] = await tx
		.update(invite)
		.set({ acceptedAt: now })
		.where(
			and(
				eq(invite.shopId, shopId),
				eq(invite.id, Number(row.invite_id)),
				isNull(invite.acceptedAt)
			)
		)
		.returning({ id: invite.id });
	if (!used) throw new Refused('gate', 'This invitation was used just now.');
	const [made] = await tx
		.insert(member)
		.values({ shopId, ...who, role: row.role, joinedAt: now })
		.onConflictDoNothing()
		.returning({ id: member.id });
	if (!made) throw new Refused('taken', 'You are in this shop already.');
	await tx.insert(event).values({
		shopId,
		at: now,
		memberId: made.id,
		about: 'member',
		aboutId: made.id,
		what: 'joined',
		detail: { role: row.role }
	});
}
