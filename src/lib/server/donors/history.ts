import type { DonorEvent } from '$lib/donors/view';
import { and, desc, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { event, member } from '../people/tables';

const withReason = (what: string, { reason, said }: Record<string, unknown>) => {
	const more = reason ?? said;
	return typeof more === 'string' ? `${what}: ${more}` : what;
};

/** What happened to a donor, the newest first. */
export async function donorEvents(tx: Tx, ctx: Context, donorId: number): Promise<DonorEvent[]> {
	const rows = await tx
		.select({ at: event.at, what: event.what, detail: event.detail, by: member.name })
		.from(event)
		.innerJoin(member, and(eq(member.shopId, event.shopId), eq(member.id, event.memberId)))
		.where(and(eq(event.shopId, ctx.shopId), eq(event.about, 'donor'), eq(event.aboutId, donorId)))
		.orderBy(desc(event.id))
		.limit(100);
	return rows.map(({ at, what, detail, by }) => ({
		at: at.toISOString(),
		by,
		said: withReason(what, detail)
	}));
}
