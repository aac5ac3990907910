// Prices: what a new part or a copy costs, for a part number or for a kind on an engine, and where it was seen.
// It keeps the list and answers which price counts for a part.
// Not for: what a used part is worth (worth, and the verdicts of parts), what a sale brought in.
export { editPrice } from './edit';
export { putPrice } from './put';
export { findPrice, getPrice, listPrices, pricedEngines } from './queries';
export type { PriceFilter } from './filter';
export { listReplaced, replaceNumber } from './replaced';
export { listRemoved, putBackPrice, removePrice } from './remove';
export { pricesFor, type PriceAsk, type PriceRow } from './prices-for';
