import { readAddress } from '$lib/bins/address';
import type { BinInput } from '$lib/bins/input';
import type { BinView } from '$lib/bins/view';
import { may } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { allow, record } from '../people';
import { mintTag } from '../tags';
import { getBin } from './queries';
import { bin } from './tables';

export const addressTaken = (address: string) =>
	new Refused(
		'taken',
		`There is a bin ${address} already. Give this one another address.`,
		'address'
	);

/** What a bin costs is the owner's figure; nobody else may set it. */
export function needOwnerForCost(ctx: Context, cents: number | null | undefined): void {
	if (cents !== null && cents !== undefined && !may(ctx.role, 'run'))
		throw new Refused('role', 'Only the owner can set what a bin costs a year.', 'yearlyCost');
}

/** A bin's address in its columns; one that is not of a rack has no rack, shelf or slot. */
export function addressColumns(typed: string) {
	const { address, rack, shelf, slot } = readAddress(typed);
	return { address, rack: rack ?? null, shelf: shelf ?? null, slot: slot ?? null };
}

export const addBin = (ctx: Context, input: BinInput): Promise<BinView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		needOwnerForCost(ctx, input.yearlyCostCents);
		const place = addressColumns(input.address);
		const [row] = await tx
			.insert(bin)
			.values({
				...input,
				...place,
				shopId: ctx.shopId,
				tag: await mintTag(tx, ctx, 'bin', input.tag),
				createdAt: ctx.now
			})
			.onConflictDoNothing()
			.returning({ id: bin.id });
		if (!row) throw addressTaken(place.address);
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'added',
			toState: 'in use',
			detail: { address: place.address }
		});
		return getBin(ctx, place.address);
	});
