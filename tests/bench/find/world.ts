import { CAUSES, findKind, kinds } from '../../../src/lib/trade';
import { GRADES, type Grade, type PartState } from '../../../src/lib/parts/words';
import type { Catalogue, Family } from './catalogue';
import { Random } from './random';

export interface WorldDonor {
	id: number;
	shop: number;
	number: number;
	family: number;
	serial: string;
	cause: string;
	takenIn: number;
	open: boolean;
}

export interface WorldPart {
	id: number;
	shop: number;
	kind: string;
	family: number;
	donor: WorldDonor | null;
	number: string;
	grade: Grade;
	state: PartState;
	bin: number | null;
	note: string;
	pulled: number;
	proved: string | null;
}

export interface WorldShop {
	id: number;
	size: number;
	donors: WorldDonor[];
	parts: WorldPart[];
	bins: string[];
}

export interface World {
	catalogue: Catalogue;
	shops: WorldShop[];
}

const DAY = 86_400_000;
export const TODAY = Date.UTC(2026, 11, 1);
const STATES: PartState[] = ['shelved', 'pulled', 'held', 'out', 'scrapped'];
const SIZES = [
	'hole 3/4 in',
	'hole 25 mm',
	'bore 1 in',
	'spacing 42 mm',
	'shaft 7/8 in',
	'pin 10 tooth',
	'plug 12 v',
	'6.5 hp',
	'shaft 1-1/8 in',
	'length 2 7/16 in'
];

/** Sizes of shops by rank: few large ones, many small. */
export function shopSizes(shops: number, parts: number): number[] {
	const raw = Array.from({ length: shops }, (_, at) => 1 / (at + 1) ** 0.8);
	const sum = raw.reduce((a, b) => a + b, 0);
	return raw.map((share) => Math.max(20, Math.round((share / sum) * parts)));
}

const binName = (at: number) =>
	`${String.fromCharCode(65 + (Math.floor(at / 40) % 26))}${1 + Math.floor(at / 1040)}-${1 + (at % 40)}`;

/** Kinds by how often they lie on a shelf: what is called for most stands there most. */
const byCalls = [...kinds]
	.filter(({ reuse }) => reuse !== 'never')
	.sort((a, b) => b.callsPerYear - a.callsPerYear);

function donorOf(random: Random, shop: number, number: number, id: number): WorldDonor {
	return {
		id,
		shop,
		number,
		family: Math.floor(298 * random.next() ** 1.6),
		serial: `${random.digits(6)}${random.letters(1)}${random.digits(4)}`,
		cause: random.pick(CAUSES).id,
		takenIn: TODAY - random.below(1100) * DAY,
		open: random.chance(0.05)
	};
}

function noteOf(random: Random, { words }: Catalogue): string {
	if (random.chance(0.15)) return '';
	const said = Array.from({ length: 1 + random.below(4) }, () => random.pick(words));
	if (random.chance(0.06)) said.push(random.pick(SIZES));
	if (random.chance(0.1)) said.push(random.pick(['red', 'black', 'green', 'old']));
	return said.join(' ');
}

function partOf(random: Random, world: Catalogue, shop: WorldShop, id: number): WorldPart {
	const donor = random.chance(0.8) ? random.pick(shop.donors) : null;
	const family = donor ? donor.family : random.below(298);
	const fitting = byCalls.filter((kind) =>
		kind.on.includes((world.families[family] as Family).class)
	);
	const kind = random.early(fitting).id;
	const state = random.chance(0.82) ? 'shelved' : random.early(STATES);
	return {
		id,
		shop: shop.id,
		kind,
		family,
		donor,
		number: random.chance(0.92) ? (world.numbers[family]!.get(kind) ?? '') : '',
		grade: random.early(GRADES),
		state,
		bin: state === 'shelved' ? random.below(shop.bins.length) : null,
		note: noteOf(random, world),
		pulled: Math.min(donor?.takenIn ?? TODAY, TODAY - 60 * DAY) + random.below(59) * DAY,
		proved: random.chance(0.3)
			? random.pick(['look-over', 'seen running', 'bench test cold', 'bench test hot'])
			: null
	};
}

/** Shops full of parts, their rows in the order of time: shops lie mixed. */
export function makeWorld(catalogue: Catalogue, sizes: readonly number[], seed: number): World {
	const random = new Random(seed);
	let donorId = 0;
	const shops = sizes.map((size, at): WorldShop => {
		const count = Math.max(2, Math.round(size * 0.06));
		const donors = Array.from({ length: count }, (_, n) =>
			donorOf(random, at + 1, n + 1, ++donorId)
		);
		const bins = Array.from({ length: Math.max(3, Math.round(size / 28)) }, (_, n) => binName(n));
		return { id: at + 1, size, donors, parts: [], bins };
	});
	const turns = shops.flatMap((shop) => Array.from({ length: shop.size }, () => shop));
	for (let at = turns.length - 1; at > 0; at -= 1) {
		const other = random.below(at + 1);
		[turns[at], turns[other]] = [turns[other]!, turns[at]!];
	}
	turns.forEach((shop, at) => shop.parts.push(partOf(random, catalogue, shop, at + 1)));
	return { catalogue, shops };
}

export const isHere = (part: WorldPart): boolean =>
	part.state !== 'out' && part.state !== 'scrapped';
export const nameOf = (id: string): string => findKind(id)!.name;
