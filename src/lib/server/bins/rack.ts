import { sayPlace } from '$lib/bins/address';
import type { RackInput } from '$lib/bins/input';
import type { BinUse } from '$lib/bins/use';
import { Refused } from '$lib/refusal';
import { and, eq, inArray, isNull, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { mintTag } from '../tags';
import { needOwnerForCost } from './add';
import { bin } from './tables';

/** The places of a rack, the floor first. */
const placesOf = ({ rack, shelves, slots }: RackInput) =>
	Array.from({ length: shelves * slots }, (_, at) => ({
		rack,
		shelf: Math.floor(at / slots) + 1,
		slot: (at % slots) + 1
	}));

const usesOn = ({ uses = [], heavyFloor }: RackInput, shelf: number): BinUse[] =>
	heavyFloor && shelf === 1 ? [...new Set<BinUse>(['heavy', ...uses])] : uses;

async function addressesTaken(tx: Tx, ctx: Context, addresses: string[]): Promise<Set<string>> {
	const rows = await tx
		.select({ address: sql<string>`upper(${bin.address})` })
		.from(bin)
		.where(
			and(
				eq(bin.shopId, ctx.shopId),
				isNull(bin.retiredAt),
				inArray(sql`upper(${bin.address})`, addresses)
			)
		);
	return new Set(rows.map((row) => row.address));
}

export interface RackMade {
	rack: string;
	/** Addresses of the bins that were made. */
	made: string[];
	/** How many stood there already. */
	there: number;
	eventId: number;
}

/** Makes the bins of a rack in one go; places that are bins already stay as they are. */
export const makeRack = (ctx: Context, input: RackInput): Promise<RackMade> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		needOwnerForCost(ctx, input.yearlyCostCents);
		const places = placesOf(input);
		const taken = await addressesTaken(tx, ctx, places.map(sayPlace));
		const wanted = places.filter((place) => !taken.has(sayPlace(place)));
		const { litres = null, loadKg = null, yearlyCostCents = null, size, place } = input;
		const same = { litres, loadKg, yearlyCostCents, size, place, createdAt: ctx.now };
		const rows = [];
		for (const each of wanted)
			rows.push({
				...{ ...same, ...each, address: sayPlace(each), uses: usesOn(input, each.shelf) },
				...{ shopId: ctx.shopId, tag: await mintTag(tx, ctx, 'bin') }
			});
		const made = rows.length
			? await tx
					.insert(bin)
					.values(rows)
					.onConflictDoNothing()
					.returning({ id: bin.id, tag: bin.tag, address: bin.address })
			: [];
		const [first] = made;
		if (!first)
			throw new Refused(
				'taken',
				`Every place of rack ${input.rack} is a bin already. Make it larger, or take other letters.`,
				'rack'
			);
		const added = { about: 'bin', toState: 'in use' } as const;
		const tags = made.map((one) => one.tag);
		for (const { id, address } of made.slice(1))
			await record(tx, ctx, { ...added, aboutId: id, what: 'added', detail: { address } });
		const eventId = await record(tx, ctx, {
			...{ ...added, aboutId: first.id, what: 'rack made' },
			detail: { address: first.address, rack: input.rack, tags }
		});
		const addresses = made.map((one) => one.address);
		return { rack: input.rack, made: addresses, there: places.length - made.length, eventId };
	});
