import type { VerdictSubject } from '$lib/parts/verdict-view';
import { Refused } from '$lib/refusal';
import { kind, standsBefore } from '$lib/trade';
import { and, asc, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { pullableDonor, type DonorRow } from '../donors';
import { allow, record } from '../people';
import { member } from '../people/tables';
import { kindsThere } from './still-on';
import { leftOn } from './tables';

export interface LeftOn {
	kind: string;
	kindName: string;
	by: string;
}

/** What somebody decided to leave on a donor, oldest first. */
export async function kindsLeftOn(tx: Tx, ctx: Context, donorId: number): Promise<LeftOn[]> {
	const rows = await tx
		.select({ kind: leftOn.kind, by: member.name })
		.from(leftOn)
		.innerJoin(member, and(eq(member.shopId, leftOn.shopId), eq(member.id, leftOn.memberId)))
		.where(and(eq(leftOn.shopId, ctx.shopId), eq(leftOn.donorId, donorId)))
		.orderBy(asc(leftOn.at), asc(leftOn.kind));
	return rows.map((row) => ({ ...row, kindName: kind(row.kind).name }));
}

const NOTHING = {
	newCents: 0,
	copyCents: null,
	source: 'left on',
	seenOn: '2000-01-01',
	stale: false
} as const;

/** For the plan: keeping what was left on, or what stands behind it, is worth nothing. */
export function withoutLeftOn(subjects: readonly VerdictSubject[], left: readonly string[]) {
	const ids = subjects.map((one) => one.kind);
	const stays = (id: string) =>
		left.includes(id) || standsBefore(id, ids).some((before) => left.includes(before));
	return subjects.map((one) =>
		stays(one.kind) ? { ...one, price: NOTHING, waiting: false, waitingFor: null } : one
	);
}

const note = (tx: Tx, ctx: Context, donor: DonorRow, what: string, kindId: string) =>
	record(tx, ctx, {
		about: 'donor',
		aboutId: donor.id,
		what,
		detail: { kind: kindId, said: kind(kindId).name }
	});

/** Leaves a kind on its donor: the pull plan counts nothing for it until it is taken up again. */
export const leaveKindOn = (ctx: Context, ref: string, kindId: string): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await pullableDonor(tx, ctx, ref);
		if (!(await kindsThere(tx, ctx, donor)).some(({ id }) => id === kindId))
			throw new Refused('taken', `${kind(kindId).name} is not on it any more.`, 'kind');
		const [left] = await tx
			.insert(leftOn)
			.values({
				shopId: ctx.shopId,
				donorId: donor.id,
				kind: kindId,
				memberId: ctx.memberId,
				at: ctx.now
			})
			.onConflictDoNothing()
			.returning({ kind: leftOn.kind });
		if (left) await note(tx, ctx, donor, 'left on', kindId);
	});

/** The opposite: the kind stands on the plan again. */
export const takeKindUp = (ctx: Context, ref: string, kindId: string): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const donor = await pullableDonor(tx, ctx, ref);
		const [was] = await tx
			.delete(leftOn)
			.where(
				and(
					...[eq(leftOn.shopId, ctx.shopId), eq(leftOn.donorId, donor.id)],
					eq(leftOn.kind, kindId)
				)
			)
			.returning({ kind: leftOn.kind });
		if (was) await note(tx, ctx, donor, 'took up again', kindId);
	});
