import { kinds, type EngineClass, type Kind } from '../../../src/lib/trade';
import { Random } from './random';

/** A family of engines, as its plate says it. */
export interface Family {
	maker: string;
	model: string;
	cc: number;
	class: EngineClass;
	shaft: 'horizontal' | 'vertical';
}

export interface Catalogue {
	makers: string[];
	families: Family[];
	/** By family, then kind: the number that is stamped on it, '' where it has none. */
	numbers: Map<string, string>[];
	/** Old number to the one that takes its place. */
	replaced: Map<string, string>;
	words: string[];
}

const STARTS =
	'bra cor dun fel gar hol jun kel lor mar nor pel ras sol tar und vor wen yar zel'.split(' ');
const ENDS = 'dane fox gate hurst kvik lane mond nell oke pike rake sted tham vale wick'.split(' ');
const TRADE =
	`bolt bracket spring gasket rusty clean boxed dusty long short left right upper lower screw clip cover plate
	threads stripped repaired welded cracked corner painted faded label missing faint scratch dent complete partial lever
	cable linkage hose pipe clamp rubber plastic steel brass alloy cast bent straight tight loose worn smooth noisy quiet`.split(
		/\s+/
	);
const CLASSES = [...'WB WB GP GP R1 R2 SN GE SA TR PW'.split(' ')] as EngineClass[];
const CCS = [
	35, 50, 72, 125, 148, 163, 173, 190, 196, 208, 212, 223, 270, 301, 344, 389, 420, 459, 500, 603,
	656, 724
];

/** A number in one of six ways of writing numbers. */
function stamped(random: Random, maker: number): string {
	const d = (count: number) => random.digits(count);
	const l = (count: number) => random.letters(count);
	const ways = [
		() => d(6),
		() => `${d(2)} ${d(3)} ${d(2)}`,
		() => `${d(5)}-${l(2)}${d(1)}-${d(3)}`,
		() => `${l(2)}${d(5)}`,
		() => `${l(1)}${d(3)}-${d(4)}`,
		() => `${d(3)}.${d(4)}${l(1)}`
	];
	return ways[maker % ways.length]!();
}

const isOn = (kind: Kind, family: Family) => kind.on.includes(family.class);

/** Makers, engines, part numbers and chains of them, all invented. */
export function makeCatalogue(seed: number): Catalogue {
	const random = new Random(seed);
	const makers = Array.from({ length: 24 }, (_, at) => {
		const name = STARTS[(at * 7) % STARTS.length]! + ENDS[(at * 11 + 3) % ENDS.length]!;
		return name[0]!.toUpperCase() + name.slice(1);
	});
	const families = Array.from({ length: 298 }, (_, at): Family => {
		const model = `${random.letters(2)}${random.pick(['-', '', ' '])}${random.digits(3)}${random.letters(1)}`;
		const shaft = random.chance(0.5) ? 'horizontal' : 'vertical';
		return {
			maker: makers[at % 24]!,
			model,
			cc: random.pick(CCS),
			class: random.pick(CLASSES),
			shaft
		};
	});
	const numbers = families.map((family, at) => {
		const own = kinds.filter((kind) => isOn(kind, family));
		return new Map(own.map(({ id }) => [id, random.chance(0.92) ? stamped(random, at % 24) : '']));
	});
	const replaced = new Map<string, string>();
	for (const own of numbers)
		for (const number of own.values())
			if (number && random.chance(0.12)) replaced.set(stamped(random, random.below(6)), number);
	for (const old of [...replaced.keys()])
		if (random.chance(0.33)) replaced.set(stamped(random, random.below(6)), old);
	const made = Array.from(
		{ length: 700 },
		() => random.pick(STARTS) + random.pick(['a', 'e', 'i', 'o']) + random.pick(ENDS)
	);
	return { makers, families, numbers, replaced, words: [...new Set([...TRADE, ...made])] };
}
