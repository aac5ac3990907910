import type { Role } from '$lib/people/role';
import { NotFound } from '$lib/refusal';
import { and, eq, isNull } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { allow } from './allow';
import { newToken, tokenHash } from './hash';
import { record } from './record';
import { apiKey, member } from './tables';

/** Makes a key for scripts; it is shown once and only its hash is kept. */
export const addKey = (
	ctx: Context,
	input: { name: string; role: Role }
): Promise<{ key: string }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const key = `ep_${newToken()}`;
		const [holder] = await tx
			.insert(member)
			.values({ shopId: ctx.shopId, name: input.name, role: input.role, joinedAt: ctx.now })
			.returning({ id: member.id });
		await tx.insert(apiKey).values({
			shopId: ctx.shopId,
			memberId: holder!.id,
			tokenHash: tokenHash(key),
			createdAt: ctx.now
		});
		await record(tx, ctx, {
			about: 'member',
			aboutId: holder!.id,
			what: 'key made',
			detail: { ...input }
		});
		return { key };
	});

export const revokeKey = (ctx: Context, id: number): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'run');
		const [row] = await tx
			.update(apiKey)
			.set({ revokedAt: ctx.now })
			.where(and(eq(apiKey.shopId, ctx.shopId), eq(apiKey.id, id), isNull(apiKey.revokedAt)))
			.returning({ memberId: apiKey.memberId });
		if (!row) throw new NotFound();
		await record(tx, ctx, { about: 'member', aboutId: row.memberId, what: 'key revoked' });
	});
