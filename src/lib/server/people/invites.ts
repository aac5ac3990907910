import type { InviteInput } from '$lib/people/input';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq, gt, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from './allow';
import { enqueue } from '../queue/enqueue';
import { newToken, tokenHash } from './hash';
import { record } from './record';
import { invite, member, person, shop } from './tables';

const DAYS_OPEN = 7;
/** A shop invites its people, it does not mail the world. */
const A_DAY = 20;

/** Invites an address; the letter leaves only if the row does. */
export const inviteMember = (ctx: Context, input: InviteInput): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const dayAgo = new Date(ctx.now.getTime() - 86_400_000);
		const today = and(eq(invite.shopId, ctx.shopId), gt(invite.sentAt, dayAgo));
		if ((await tx.$count(invite, today)) >= A_DAY)
			throw new Refused('too many', `${A_DAY} invitations a day. Send the next one tomorrow.`);
		const [already] = await tx
			.select({ name: member.name })
			.from(member)
			.innerJoin(person, eq(person.id, member.personId))
			.where(and(eq(member.shopId, ctx.shopId), eq(person.email, input.email)));
		if (already) throw new Refused('taken', `${already.name} is in this shop already.`, 'email');
		const token = newToken();
		const [row] = await tx
			.insert(invite)
			.values({
				shopId: ctx.shopId,
				...input,
				tokenHash: tokenHash(token),
				invitedBy: ctx.memberId,
				sentAt: ctx.now,
				expiresAt: new Date(ctx.now.getTime() + DAYS_OPEN * 86_400_000)
			})
			.returning({ id: invite.id });
		const [here] = await tx.select({ name: shop.name }).from(shop).where(eq(shop.id, ctx.shopId));
		const letter = {
			to: input.email,
			role: input.role,
			shopName: here!.name,
			token,
			inviteId: row!.id
		};
		await enqueue(tx, 'people.invite', letter);
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'invited',
			detail: { ...input }
		});
	});

export const withdrawInvite = (ctx: Context, id: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const [row] = await tx
			.update(invite)
			.set({ withdrawnAt: ctx.now })
			.where(and(eq(invite.shopId, ctx.shopId), eq(invite.id, id), isNull(invite.acceptedAt)))
			.returning({ email: invite.email });
		if (!row) throw new NotFound();
		await record(tx, ctx, {
			about: 'shop',
			aboutId: ctx.shopId,
			what: 'invite withdrawn',
			detail: row
		});
	});
