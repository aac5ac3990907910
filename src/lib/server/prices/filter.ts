import { engineKey, numberKey } from '$lib/codes/number';
import { staleBefore } from '$lib/prices/stale';
import type { PriceSort } from '$lib/prices/view';
import { kinds, matchKinds } from '$lib/trade';
import { and, eq, ilike, inArray, like, lt, or, sql, type SQL } from 'drizzle-orm';
import type { Context } from '../context';
import { price } from './tables';

export interface PriceFilter {
	q?: string;
	kind?: string;
	stale?: boolean;
	sort?: PriceSort;
	down?: boolean;
	limit?: number;
	cursor?: string;
}

const byName = [...kinds].sort((a, b) => a.name.localeCompare(b.name)).map(({ id }) => id);

/** What each column sorts by: always text or number, never null, so that pages join without a seam. */
export const SORTED_BY: Record<PriceSort, { of: SQL; as: 'text' | 'bigint' }> = {
	kind: {
		of: sql`coalesce(array_position(${sql.param(`{${byName.join(',')}}`)}::text[], ${price.kind}), 0)`,
		as: 'bigint'
	},
	engine: { of: sql`${price.engineKey}`, as: 'text' },
	number: { of: sql`${price.numberKey}`, as: 'text' },
	new: { of: sql`${price.newCents}`, as: 'bigint' },
	copy: { of: sql`coalesce(${price.copyCents}, 0)`, as: 'bigint' },
	seen: { of: sql`${price.seenOn}::text`, as: 'text' }
};

const literally = (text: string) => text.replace(/[\\%_]/g, '\\$&');

function wordsMatch(q: string): SQL | undefined {
	const named = matchKinds(q).map(({ kind }) => kind.id);
	const [engine, number] = [engineKey(q), numberKey(q)];
	return or(
		named.length > 0 ? inArray(price.kind, named) : undefined,
		engine ? like(price.engineKey, `%${engine}%`) : undefined,
		number ? like(price.numberKey, `%${number}%`) : undefined,
		ilike(price.source, `%${literally(q)}%`)
	);
}

/** Which prices a filter lets through. */
export const matching = (ctx: Context, filter: PriceFilter, staleDays: number) =>
	and(
		eq(price.shopId, ctx.shopId),
		filter.kind ? eq(price.kind, filter.kind) : undefined,
		filter.stale ? lt(price.seenOn, staleBefore(ctx.now, staleDays)) : undefined,
		filter.q?.trim() ? wordsMatch(filter.q.trim()) : undefined
	);
