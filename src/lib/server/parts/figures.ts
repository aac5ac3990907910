import { withHistory } from '$lib/parts/learned';
import type { ShopFigures } from '$lib/parts/learned-view';
import { inShop, type Context } from '../context';
import { getPolicy } from '../people';
import { observed } from './observed';

/** The figures by which verdicts on these kinds are made: the policy and what the history says; null: on any. */
export const figuresFor = (ctx: Context, kinds: readonly string[] | null): Promise<ShopFigures> =>
	inShop(ctx, async (tx, ctx) => withHistory(await getPolicy(ctx), await observed(tx, ctx, kinds)));
