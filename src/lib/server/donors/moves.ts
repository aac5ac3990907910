import type { MoveInput } from '$lib/donors/input';
import { afterMove, noMoveSaid, type DonorMove } from '$lib/donors/state';
import type { DonorState } from '$lib/donors/words';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { gatesOf, needPictures, needReason, needRoom, passGates } from './gates';
import { donorRow } from './rows';
import { writeMove } from './write-move';

const SAID: Record<DonorMove, string> = {
	strip: 'put on the bench',
	park: 'parked',
	finish: 'finished stripping',
	reopen: 'reopened',
	scrap: 'went to scrap',
	sell: 'sold whole'
};

const stamped = (to: DonorState, now: Date) =>
	to === 'gone' ? {} : { strippedAt: to === 'stripped' ? now : null };

export const move = (
	ctx: Context,
	ref: string,
	how: DonorMove,
	{ reason }: MoveInput,
	more: Record<string, unknown> = {}
): Promise<number> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, how === 'sell' ? 'trade' : 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const to = afterMove(row.state, how);
		if (!to) throw new Refused('gate', noMoveSaid(row.state, how));
		needReason(row, how, reason);
		if (how === 'finish') await needPictures(tx, ctx, row.id);
		const overruled = passGates(ctx, await gatesOf(tx, ctx, row, how), reason);
		return writeMove(tx, ctx, row, {
			to,
			what: SAID[how],
			set: {
				...stamped(to, ctx.now),
				...(overruled ? { gateOverruled: true } : {}),
				...(to === 'parked' ? { reviewOn: await needRoom(tx, ctx) } : {})
			},
			detail: { ...more, ...(reason ? { reason } : {}) }
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
