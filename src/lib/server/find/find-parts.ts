import type { FindQuery } from '$lib/find/input';
import { readSearch } from '$lib/find/plan';
import type { Found } from '$lib/find/view';
import { findKind } from '$lib/trade';
import { inShop, type Context } from '../context';
import { partsByIds } from '../parts';
import { nearestKinds } from './nearest';
import { lookAtShelf } from './shelf';
import { donorsWith } from './still-on';

/**
 * Looks for parts: a page of them, what the answer could be narrowed to, donors that still carry one, and,
 * where nothing answers, the kinds that come nearest.
 */
export const findParts = (ctx: Context, query: FindQuery): Promise<Found> =>
	inShop(ctx, async (tx, ctx) => {
		const plan = readSearch(query.q ?? '');
		const { ids, next, total, facets } = await lookAtShelf(tx, ctx, plan, query);
		const kinds = facets.kind.map((one) => ({
			...one,
			said: findKind(one.value)?.name ?? one.value
		}));
		return {
			items: await partsByIds(ctx, ids),
			total,
			facets: { ...facets, kind: kinds },
			donors: await donorsWith(tx, ctx, plan, query.kind),
			nearest: total === 0 ? await nearestKinds(tx, ctx, plan, query.kind) : [],
			next
		};
	});
