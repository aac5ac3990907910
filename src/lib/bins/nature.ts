import { kind, type Kind } from '../trade';
import type { BinUse } from './use';

/** Light enough to be reached down from above the shoulder. */
export const LIGHT_GRAMS = 1500;
/** From here on nothing goes above the hip. */
export const HEAVY_GRAMS = 5000;

const NO_FUEL = ['intake', 'choke'];
const METERS = ['coil', 'trigger', 'hourmeter', 'regulator', 'avr'];
const LININGS = ['brake', 'cclutch', 'friction', 'sawclutch', 'chainbrake'];

const heldFuel = ({ id, system }: Kind) =>
	(system === 'Fuel' && !NO_FUEL.includes(id)) || id === 'sawtank';
const isElectric = ({ id, system, scrapClass }: Kind) =>
	system === 'Charging / electrical' ||
	(scrapClass === 'Cu-M' && id !== 'fuel-sol') ||
	['trigger', 'avr', 'brushholder', 'hourmeter', 'ptoswitch'].includes(id);
const rusts = ({ scrapClass, keeping }: Kind) =>
	scrapClass.startsWith('Fe') || /rust/i.test(keeping);
const isOiled = ({ keeping }: Kind) => /\boil(ed)?\b|fog/i.test(keeping);

/** The middle of what parts of a kind weigh. */
export const usualGrams = ({ massLowGrams, massHighGrams }: Kind): number =>
	Math.round((massLowGrams + massHighGrams) / 2);

/** What a part of this kind should lie among: the uses of a bin that suit it. */
export function usesFor(kindId: string, grams = usualGrams(kind(kindId))): BinUse[] {
	const it = kind(kindId);
	return [
		...(grams >= LIGHT_GRAMS ? (['heavy'] as const) : []),
		...(rusts(it) || isElectric(it) ? (['dry'] as const) : []),
		...(heldFuel(it) ? (['fuel'] as const) : []),
		...(it.ages ? (['rubber'] as const) : []),
		...(it.size === 's' && grams < LIGHT_GRAMS ? (['small'] as const) : [])
	];
}

const HARMS: { does: (one: Kind) => boolean; to: (other: Kind) => boolean; said: string }[] = [
	{ does: heldFuel, to: (it) => isElectric(it), said: 'fuel eats the insulation of electrics' },
	{ does: heldFuel, to: (it) => it.id === 'friction', said: 'fuel rots rubber' },
	{ does: isOiled, to: (it) => LININGS.includes(it.id), said: 'an oiled lining slips' },
	{
		does: (it) => it.id === 'flywheel',
		to: (it) => METERS.includes(it.id),
		said: 'its magnets spoil coils and meters'
	}
];

/** Why two kinds may not lie in one bin, or null where they may; the same either way round. */
export function whyApart(one: string, other: string): string | null {
	if (one === other) return null;
	const [a, b] = [kind(one), kind(other)];
	const rule = HARMS.find(
		({ does, to }) => (does(a) && to(b) && !does(b)) || (does(b) && to(a) && !does(a))
	);
	return rule?.said ?? null;
}
