import type { Scrap } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import { changePart, partFor, type Done } from './row';

/** To the scrap, with the reason; a hold on it ends. */
export const scrapPart = (ctx: Context, tag: string, input: Scrap): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'scrap');
		const set = {
			state: 'scrapped',
			scrapReason: input.reason,
			destroyed: input.destroyed ?? false,
			binId: null,
			boxId: null,
			heldFor: null,
			heldUntil: null
		} as const;
		return changePart(tx, ctx, row, 'scrap', set, {
			reason: input.reason,
			destroyed: input.destroyed ?? false
		});
	});
