import type { Draws } from './random';
import type { Scenario } from './scenario';
import { WEEKS } from './season';

/** A Poisson stream whose rate follows the calendar, by thinning. */
export function arrivals(rate: number, until: number, scenario: Scenario, from: Draws): number[] {
	const { calls } = scenario.calendar;
	const most = Math.max(...calls);
	const found: number[] = [];
	for (let at = from.exponential(rate * most); at < until; at += from.exponential(rate * most)) {
		const week = Math.floor((at % 1) * WEEKS);
		if (from.next() * most < (calls[week] ?? 1)) found.push(at);
	}
	return found;
}
