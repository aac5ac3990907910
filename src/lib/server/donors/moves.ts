import type { MoveInput } from '$lib/donors/input';
import { afterMove, gatesShut, noMoveSaid, type DonorMove } from '$lib/donors/state';
import type { DonorState } from '$lib/donors/words';
import { may } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { donorRow, newestRelease, todayIn, type DonorRow } from './rows';
import { donor } from './tables';

const SAID: Record<DonorMove, string> = {
	strip: 'put on the bench',
	park: 'parked',
	finish: 'finished stripping',
	reopen: 'reopened'
};

/** Refuses while a gate is shut. The owner passes the release and its hold date with a reason. */
async function needGates(tx: Tx, ctx: Context, row: DonorRow, reason?: string): Promise<void> {
	const release = await newestRelease(tx, ctx, row.id);
	const shut = gatesShut(row, release, await todayIn(ctx)).filter(
		(gate) => !(gate.overrulable && reason && may(ctx.role, 'run'))
	);
	if (shut.length === 0) return;
	const hint =
		may(ctx.role, 'run') && shut.some((gate) => gate.overrulable)
			? ' You may overrule the release with a reason.'
			: '';
	throw new Refused('gate', shut.map((gate) => gate.said).join(' ') + hint, 'reason');
}

const stamped = (to: DonorState, now: Date) =>
	to === 'stripped' ? { strippedAt: now } : { strippedAt: null };

const move = (ctx: Context, ref: string, how: DonorMove, { reason }: MoveInput): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const to = afterMove(row.state, how);
		if (!to) throw new Refused('gate', noMoveSaid(row.state, how));
		if (to === 'on the bench') await needGates(tx, ctx, row, reason);
		await tx
			.update(donor)
			.set({ state: to, ...stamped(to, ctx.now), version: row.version + 1 })
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.id)));
		await record(tx, ctx, {
			about: 'donor',
			aboutId: row.id,
			what: SAID[how],
			fromState: row.state,
			toState: to,
			detail: reason ? { reason } : {}
		});
	});

/** Whole or parked to the bench, when the cause is named, the release in order and all is safe. */
export const stripDonor = (ctx: Context, ref: string, input: MoveInput = {}) =>
	move(ctx, ref, 'strip', input);

/** A whole donor kept for pulling when somebody calls. */
export const parkDonor = (ctx: Context, ref: string, input: MoveInput = {}) =>
	move(ctx, ref, 'park', input);

export const finishDonor = (ctx: Context, ref: string, input: MoveInput = {}) =>
	move(ctx, ref, 'finish', input);

/** A stripped donor back to the bench, a parked one back to whole. */
export const reopenDonor = (ctx: Context, ref: string, input: MoveInput = {}) =>
	move(ctx, ref, 'reopen', input);
