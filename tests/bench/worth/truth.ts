import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Level } from '$lib/trade';
import type { Draws } from './random';

/** How far the shop's defaults are from its own truth. */
export type TruthName =
	| 'as the defaults say'
	| 'a third of the calls'
	| 'three times the calls'
	| 'calls and chances mixed'
	| 'scattered';

/** What is true of one kind in this shop. */
export interface KindTruth {
	/** Times the kind's usual calls. */
	calls: number;
	chances: Readonly<Record<Level, number>>;
	/** Spread between families beyond their mark, of the logarithm. */
	spread: number;
}

const THREE = 3;

function withOdds(chances: Readonly<Record<Level, number>>, times: number): Record<Level, number> {
	const turned = (chance: number) => (chance * times) / (1 - chance + chance * times);
	const { high, medium, low, ruined } = chances;
	return { high: turned(high), medium: turned(medium), low: turned(low), ruined };
}

/** Draws in the same number for every truth, so that worlds of one seed stay comparable. */
export function kindTruth(name: TruthName, from: Draws): KindTruth {
	const up = from.next() < 0.5;
	const chanceUp = from.next() < 0.5;
	const scatter = Math.exp(0.6 * from.normal() - 0.18);
	const usual = DEFAULT_POLICY.chances;
	switch (name) {
		case 'as the defaults say':
			return { calls: 1, chances: usual, spread: 0 };
		case 'a third of the calls':
			return { calls: 1 / THREE, chances: usual, spread: 0 };
		case 'three times the calls':
			return { calls: THREE, chances: usual, spread: 0 };
		case 'calls and chances mixed':
			return {
				calls: up ? THREE : 1 / THREE,
				chances: withOdds(usual, chanceUp ? THREE : 1 / THREE),
				spread: 0
			};
		case 'scattered':
			return { calls: scatter, chances: usual, spread: 0.5 };
	}
}
