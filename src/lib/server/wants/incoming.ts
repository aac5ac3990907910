import { wantSaid } from '$lib/wants/state';
import { Refused } from '$lib/refusal';
import { and, eq, inArray } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { letterSettings } from '../customers';
import { customer } from '../customers/tables';
import type { Db, Tx } from '../db';
import { part } from '../parts/tables';
import { matchDonor, matchPart, matchWant } from './match';
import { changeWant, ownWant } from './rows';
import { want } from './tables';
import { tellWant } from './tell';

/** What a room to the left announces: what came in, when, and whether anew or only known better. */
export interface Incoming {
	shopId: number;
	/** When it came in, as a job carries times. */
	at: string;
	isNew: boolean;
	partId?: number;
	donorId?: number;
}

const looking = (db: Db, shopId: number, now: Date): Context => ({
	...{ db, shopId, now, memberId: 0 },
	role: 'counter'
});

/** A hold for a want ran out or was let go: it is looked out for again. */
async function noteFreed(tx: Tx, ctx: Context, partId: number): Promise<void> {
	const rows = await tx
		.select({ want, heldFor: part.heldFor })
		.from(want)
		.innerJoin(part, and(eq(part.shopId, want.shopId), eq(part.id, want.partId)))
		.where(and(eq(want.shopId, ctx.shopId), eq(want.partId, partId), eq(want.state, 'said yes')))
		.for('no key update', { of: want });
	for (const { want: row, heldFor } of rows) {
		if (heldFor === wantSaid(row.number)) continue;
		await changeWant(tx, { ...ctx, memberId: row.memberId }, row, 'hold ended', { partId: null });
	}
}

/** Those who wait and are told without anybody's tap, where the shop wants that: by letter, in the name of who took the want. */
async function tellThemselves(ctx: Context, wantIds: readonly number[]): Promise<void> {
	if (wantIds.length === 0 || !(await letterSettings(ctx)).tellByItself) return;
	const rows = await inShop(ctx, (tx) =>
		tx
			.select({ number: want.number, memberId: want.memberId })
			.from(want)
			.innerJoin(customer, and(eq(customer.shopId, want.shopId), eq(customer.id, want.customerId)))
			.where(
				and(
					eq(want.shopId, ctx.shopId),
					inArray(want.id, [...wantIds]),
					eq(want.state, 'waiting'),
					eq(want.tellBy, 'e-mail')
				)
			)
	);
	for (const { number, memberId } of rows) {
		const input = { by: 'e-mail', byItself: true } as const;
		await tellWant({ ...ctx, memberId }, String(number), input).catch((fault: unknown) => {
			// no address, no letters wanted, gone meanwhile: it stays on the list for the counter
			if (!(fault instanceof Refused)) throw fault;
		});
	}
}

/** What came in is laid beside those who wait. Run twice it is done once. */
export async function takeNotice(db: Db, incoming: Incoming, now: Date): Promise<void> {
	const ctx = looking(db, incoming.shopId, now);
	const coming = { at: new Date(incoming.at), isNew: incoming.isNew };
	const found = await inShop(ctx, async (tx, ctx) => {
		if (incoming.donorId !== undefined) return matchDonor(tx, ctx, incoming.donorId, coming);
		await noteFreed(tx, ctx, incoming.partId!);
		return matchPart(tx, ctx, incoming.partId!, coming);
	});
	await tellThemselves(ctx, found);
}

/** A new want once more, after its own transaction: what came in beside it is found now. */
export async function lookAgain(
	db: Db,
	{ shopId, wantId, at }: { shopId: number; wantId: number; at: string },
	now: Date
): Promise<void> {
	await inShop(looking(db, shopId, now), async (tx, ctx) => {
		const [row] = await tx.select().from(want).where(ownWant(ctx, wantId));
		if (row) await matchWant(tx, ctx, row, { at: new Date(at), isNew: true });
	});
}
