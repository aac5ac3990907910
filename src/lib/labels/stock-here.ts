import type { LabelChoice } from './choice';
import { isStockId, type StockId } from './stocks';

/** What the printer beside this device takes: what was chosen, else what was printed on last. */
export const STOCK_COOKIE = 'labels-stock';

interface Kept {
	get(name: string): string | undefined;
}

export function stockHere(choice: Pick<LabelChoice, 'stock'>, kept: Kept): StockId {
	const last = kept.get(STOCK_COOKIE) ?? '';
	return choice.stock ?? (isStockId(last) ? last : 'roll-62x29');
}
