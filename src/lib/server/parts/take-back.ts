import type { TakeBack } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import { redPlace } from './place';
import { changePart, partFor, type Done } from './row';

/** A part that was fitted or sold came back: into the red bin until a test is passed. */
export const takeBackPart = (
	ctx: Context,
	tag: string,
	input: TakeBack
): Promise<Done & { to: string }> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'take back');
		const { binId, boxId, said } = await redPlace(tx, ctx);
		const set = { state: 'back', binId, boxId, outAs: null, outTo: null, outCents: null } as const;
		const detail = { reason: input.reason, was: row.outAs };
		return { ...(await changePart(tx, ctx, row, 'take back', set, detail)), to: said };
	});
