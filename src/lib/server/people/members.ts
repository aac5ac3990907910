import type { MemberEdit } from '$lib/people/input';
import type { MemberRow, OpenInvite } from '$lib/people/view';
import { NotFound, Refused } from '$lib/refusal';
import { and, asc, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from './allow';
import type { Tx } from '../db';
import { record } from './record';
import { apiKey, invite, member, person } from './tables';

/** Everybody in the shop, keys last. */
export const listMembers = (ctx: Context): Promise<MemberRow[]> =>
	inShop(ctx, async (tx) => {
		allow(ctx, 'run');
		const rows = await tx
			.select({
				id: member.id,
				name: member.name,
				email: person.email,
				role: member.role,
				disabledAt: member.disabledAt,
				version: member.version,
				keyId: apiKey.id,
				revokedAt: apiKey.revokedAt
			})
			.from(member)
			.leftJoin(person, eq(person.id, member.personId))
			.leftJoin(apiKey, and(eq(apiKey.shopId, member.shopId), eq(apiKey.memberId, member.id)))
			.where(eq(member.shopId, ctx.shopId))
			.orderBy(asc(member.name), asc(member.id));
		return rows.map(({ disabledAt, revokedAt, ...row }) => ({
			...row,
			disabled: disabledAt !== null || revokedAt !== null
		}));
	});

export const listInvites = (ctx: Context): Promise<OpenInvite[]> =>
	inShop(ctx, async (tx) => {
		allow(ctx, 'run');
		return tx
			.select({
				id: invite.id,
				email: invite.email,
				role: invite.role,
				expiresAt: invite.expiresAt
			})
			.from(invite)
			.where(
				and(eq(invite.shopId, ctx.shopId), isNull(invite.acceptedAt), isNull(invite.withdrawnAt))
			)
			.orderBy(asc(invite.id));
	});

async function otherOwners(tx: Tx, ctx: Context, but: number): Promise<number> {
	const rows = await tx
		.select({ id: member.id })
		.from(member)
		.where(and(eq(member.shopId, ctx.shopId), eq(member.role, 'owner'), isNull(member.disabledAt)))
		.orderBy(asc(member.id))
		.for('no key update');
	return rows.filter((row) => row.id !== but).length;
}

/** Changes a member's role or shuts them out; it acts on their next request. */
export const editMember = (ctx: Context, input: MemberEdit): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const others = await otherOwners(tx, ctx, input.memberId);
		const mine = and(eq(member.shopId, ctx.shopId), eq(member.id, input.memberId));
		const [row] = await tx.select().from(member).where(mine).for('no key update');
		if (!row) throw new NotFound();
		if (row.version !== input.version)
			throw new Refused(
				'changed',
				`Somebody changed ${row.name} meanwhile: the role is now ${row.role}. Look and save again.`
			);
		const role = input.role ?? row.role;
		const disabledAt =
			input.disabled === undefined ? row.disabledAt : input.disabled === 'yes' ? ctx.now : null;
		if (others === 0 && row.role === 'owner' && (role !== 'owner' || disabledAt))
			throw new Refused('gate', 'A shop needs an owner: make somebody else owner first.');
		await tx
			.update(member)
			.set({ role, disabledAt, version: row.version + 1 })
			.where(mine);
		await record(tx, ctx, {
			about: 'member',
			aboutId: row.id,
			what: 'changed',
			detail: {
				before: { role: row.role, disabled: row.disabledAt !== null },
				after: { role, disabled: disabledAt !== null }
			}
		});
	});
