import { dayAfter } from '$lib/donors/day';
import { gatesShut, releaseGate, type DonorMove, type Gate } from '$lib/donors/state';
import { may } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { kind } from '$lib/trade';
import { and, eq, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part, partPhoto } from '../parts/tables';
import { getPolicy } from '../people';
import { newestRelease, todayIn, type DonorRow } from './rows';
import { donor } from './tables';

/**
 * Refuses while a gate is shut; says whether the release was passed by the owner, who does so with a reason.
 * A newer release is asked again.
 */
export function passGates(ctx: Context, gates: Gate[], reason?: string): boolean {
	const owner = may(ctx.role, 'run');
	const shut = gates.filter((gate) => !(gate.overrulable && reason && owner));
	if (shut.length === 0) return gates.length > 0;
	const mayPass = owner && shut.some((gate) => gate.overrulable);
	const hint = mayPass ? ' You may overrule the release with a reason.' : '';
	throw new Refused('gate', shut.map((gate) => gate.said).join(' ') + hint, 'reason');
}

/** The gates before a step. */
export async function gatesOf(
	tx: Tx,
	ctx: Context,
	row: DonorRow,
	how: DonorMove
): Promise<Gate[]> {
	if (!['strip', 'scrap', 'sell'].includes(how)) return [];
	const [release, today] = [await newestRelease(tx, ctx, row.id), await todayIn(ctx)];
	return how === 'strip' ? gatesShut(row, release, today) : releaseGate(row, release, today);
}

export function needReason({ state }: DonorRow, how: DonorMove, reason?: string): void {
	if (how === 'reopen' && state === 'stripped' && !reason)
		throw new Refused('bad input', 'Say why it is opened again.', 'reason');
}

/** The day by which the one to be parked is looked at again. How many are parked is limited: what stands in the yard is forgotten. */
export async function needRoom(tx: Tx, ctx: Context): Promise<string> {
	const { parkedMost, parkedReviewDays } = await getPolicy(ctx);
	const [row] = await tx
		.select({ parked: sql<number>`count(*)::int` })
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.state, 'parked')));
	if (row!.parked >= parkedMost)
		throw new Refused(
			'gate',
			`${row!.parked} are parked already. Strip, sell or scrap one first; the owner sets how many under Worth.`
		);
	return dayAfter(await todayIn(ctx), parkedReviewDays);
}

/** Why neither a donor nor anything off it may leave yet, or null. */
export async function notToLeave(tx: Tx, ctx: Context, donorId: number): Promise<string | null> {
	const [row] = await tx
		.select({ gateOverruled: donor.gateOverruled })
		.from(donor)
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, donorId)));
	const release = await newestRelease(tx, ctx, donorId);
	return releaseGate(row!, release, await todayIn(ctx))[0]?.said ?? null;
}

/** A donor is not closed while a safety part off it is said to be destroyed and no picture shows it. */
export async function needPictures(tx: Tx, ctx: Context, donorId: number): Promise<void> {
	const unseen = await tx
		.select({ tag: part.tag, kind: part.kind })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				eq(part.donorId, donorId),
				eq(part.destroyed, true),
				sql`not exists (select 1 from ${partPhoto} p
					where p.shop_id = ${ctx.shopId} and p.part_id = ${part.id})`
			)
		);
	const first = unseen.find((one) => kind(one.kind).reuse.startsWith('safety'));
	if (first)
		throw new Refused(
			'gate',
			`Photograph ${kind(first.kind).name} ${first.tag} as it is now, destroyed, before this is closed.`
		);
}
