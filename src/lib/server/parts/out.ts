import type { Fit, Sell } from '$lib/parts/input';
import { kind } from '$lib/trade';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { changePart, partFor, type Done } from './row';

const gone = { state: 'out', binId: null, boxId: null, heldFor: null, heldUntil: null } as const;

/** Fitted on a job of this shop. */
export const fitPart = (ctx: Context, tag: string, input: Fit): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'fit');
		const set = { ...gone, outAs: 'fitted', outTo: input.job, outCents: null } as const;
		return changePart(tx, ctx, row, 'fit', set, { job: input.job });
	});

/** Sold over the counter; a kind that only the trade may have needs the name of who took it. */
export const sellPart = (ctx: Context, tag: string, input: Sell): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'sell');
		if (kind(row.kind).reuse === 'safety-trade' && !input.to)
			throw new Refused(
				'gate',
				`${kind(row.kind).name}: sold to the trade only. Say which repair business takes it.`,
				'to'
			);
		const set = { ...gone, outAs: 'sold', outTo: input.to ?? null, outCents: input.cents } as const;
		return changePart(tx, ctx, row, 'sell', set, { to: input.to ?? '', cents: input.cents });
	});
