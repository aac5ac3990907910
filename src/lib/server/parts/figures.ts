import { withHistory } from '$lib/parts/learned';
import type { Observed, ShopFigures } from '$lib/parts/learned-view';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { getPolicy } from '../people';
import { observed } from './observed';
import { recentlyObserved } from './recent-figures';

/** These kinds counted now; calls for all others, which only tell how busy the shop is, as of late. */
async function counted(tx: Tx, ctx: Context, kinds: readonly string[] | null): Promise<Observed> {
	if (kinds === null) return observed(tx, ctx, null);
	const now = await observed(tx, ctx, kinds);
	const asked = new Set(kinds);
	const { calls } = await recentlyObserved(ctx);
	return { ...now, calls: [...now.calls, ...calls.filter(({ kind }) => !asked.has(kind))] };
}

/** The figures by which verdicts on these kinds are made: the policy and what the history says; null: on any. */
export const figuresFor = (ctx: Context, kinds: readonly string[] | null): Promise<ShopFigures> =>
	inShop(ctx, async (tx, ctx) => withHistory(await getPolicy(ctx), await counted(tx, ctx, kinds)));
