import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Kind, Level } from '$lib/trade';
import type { Item } from './market';

/** What the calculator is told about a part. */
export interface Knowledge {
	calls(item: Item, at: number): number;
	chance(item: Item, level: Level): number;
	comeBack(kind: Kind): number;
	price(item: Item, level: Level): number;
	called(item: Item): void;
	tested(item: Item, level: Level, passed: boolean): void;
	sold(item: Item, level: Level, paidCents: number, cameBack: boolean): void;
}

const nothing = () => {};
const forgets = { called: nothing, tested: nothing, sold: nothing };

/** The shop's true rates and chances. */
export const told = (): Knowledge => ({
	...forgets,
	calls: (item) => item.trueCalls,
	chance: (item, level) => item.trueChance[level],
	comeBack: (kind) => kind.comeBack,
	price: (item, level) => item.usedCents[level]
});

/** The defaults, whatever happens. */
export const defaults = (): Knowledge => ({
	...told(),
	calls: (item) => item.usualCalls,
	chance: (_, level) => DEFAULT_POLICY.chances[level]
});
