import { and, desc, eq, inArray, or } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { price } from './tables';

export type PriceRow = typeof price.$inferSelect;

/** One thing that a price is wanted for; keys as `$lib/codes/number` makes them. */
export interface PriceAsk {
	key: string;
	kind: string;
	engineKey: string;
	numberKeys: readonly string[];
}

const filled = (keys: Iterable<string>) => [...new Set(keys)].filter((key) => key !== '');

async function candidates(tx: Tx, ctx: Context, asks: readonly PriceAsk[]): Promise<PriceRow[]> {
	const numbers = filled(asks.flatMap((ask) => ask.numberKeys));
	const engines = filled(asks.map((ask) => ask.engineKey));
	if (numbers.length + engines.length === 0) return [];
	const kinds = [...new Set(asks.map((ask) => ask.kind))];
	return tx
		.select()
		.from(price)
		.where(
			and(
				eq(price.shopId, ctx.shopId),
				or(
					numbers.length > 0 ? inArray(price.numberKey, numbers) : undefined,
					engines.length > 0
						? and(inArray(price.kind, kinds), inArray(price.engineKey, engines))
						: undefined
				)
			)
		)
		.orderBy(desc(price.seenOn), desc(price.id));
}

/** The lower the nearer: by number and kind, by number, by kind and engine, the same with another number. */
function nearness(row: PriceRow, ask: PriceAsk): number | null {
	const sameKind = row.kind === ask.kind;
	if (row.numberKey !== '' && ask.numberKeys.includes(row.numberKey)) return sameKind ? 0 : 1;
	if (!sameKind || row.engineKey === '' || row.engineKey !== ask.engineKey) return null;
	return row.numberKey === '' ? 2 : 3;
}

/**
 * The price that counts for each of the asked: by part number, then by kind on that engine, then none.
 * One query for any number of them; of equally near prices the one seen last counts.
 */
export async function pricesFor(
	tx: Tx,
	ctx: Context,
	asks: readonly PriceAsk[]
): Promise<Map<string, PriceRow>> {
	const found = new Map<string, PriceRow>();
	const rows = await candidates(tx, ctx, asks);
	for (const ask of asks) {
		let best: { row: PriceRow; at: number } | undefined;
		for (const row of rows) {
			const at = nearness(row, ask);
			if (at !== null && (!best || at < best.at)) best = { row, at };
		}
		if (best) found.set(ask.key, best.row);
	}
	return found;
}
