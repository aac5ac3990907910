import type { NamedRule, Rule } from './rule';
import type { Unit } from './shelf';
import type { BenchPart } from './world';

const asked = ({ item, level }: BenchPart) => item.usedCents[level];

const nothing = () => {};

/** A rule of thumb: keeps what passes, drops the cheapest where there is no room, never learns. */
export function thumb(passes: (part: BenchPart) => boolean, cleanNow = false): Rule {
	return {
		keep: (_, alive) => alive.filter(passes),
		cleanNow: () => cleanNow,
		drop: (units: readonly Unit[]) =>
			units.reduce((least, unit) => (asked(unit.part) < asked(least.part) ? unit : least)),
		purge: () => [],
		called: nothing,
		tested: nothing,
		sold: nothing
	};
}

export const KEEP_NOTHING: NamedRule = { name: 'keep nothing', make: () => thumb(() => false) };

export const THUMBS: readonly NamedRule[] = [
	{ name: 'keep everything', make: () => thumb(() => true) },
	KEEP_NOTHING,
	{ name: 'keep over $15', make: () => thumb((part) => asked(part) > 1500) },
	{
		name: 'keep over half of new',
		make: () => thumb((part) => asked(part) > part.item.newCents / 2)
	},
	{
		name: 'clean everything at once',
		make: () => thumb((part) => asked(part) >= 1000, true)
	}
];
