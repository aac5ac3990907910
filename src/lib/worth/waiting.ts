/** What the wait for the k-th call depends on. Rates per year; waiting is a chance, 0 to 1. */
export interface Waiting {
	callsPerYear: number;
	place: number;
	moneyRate: number;
	dyingRate: number;
	waiting: number;
}

/** The want that is open now counts for the first unit only. */
export function openWant(wait: Waiting): number {
	return wait.place === 1 ? wait.waiting : 0;
}

function callBefore(wait: Waiting, rate: number): number {
	if (wait.callsPerYear === 0) return 0;
	return Math.pow(wait.callsPerYear / (wait.callsPerYear + rate), wait.place);
}

/**
 * The discounted chance that the k-th call comes before the part cannot be sold any more: the
 * Laplace transform of an Erlang wait, (calls / (calls + money + dying)) to the power k. With an
 * open want of chance w it is w + (1 - w) of that. Nobody calls: 0. No money cost and no dying: 1.
 * Source: Rosenfield 1985, "Salvaging of Excess Inventory".
 */
export function reach(wait: Waiting): number {
	const want = openWant(wait);
	return want + (1 - want) * callBefore(wait, wait.moneyRate + wait.dyingRate);
}

/** The chance, 0 to 1, that it is ever called for before it dies out. No discounting. */
export function everCalled(wait: Waiting): number {
	const want = openWant(wait);
	return want + (1 - want) * callBefore(wait, wait.dyingRate);
}

/** Expected years until its call; null when nobody calls. */
export function waitYears(wait: Waiting): number | null {
	const want = openWant(wait);
	if (want === 1) return 0;
	const years = ((1 - want) * wait.place) / wait.callsPerYear;
	return Number.isFinite(years) ? years : null;
}
