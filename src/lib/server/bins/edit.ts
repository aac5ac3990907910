import type { BinEdit } from '$lib/bins/input';
import type { BinView } from '$lib/bins/view';
import { may } from '$lib/people/role';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq, isNull, ne, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { record } from '../people';
import { addressColumns, addressTaken, needOwnerForCost } from './add';
import { findPlace, getBin, type BinRow } from './queries';
import { bin } from './tables';

const FIELDS = {
	address: 'address',
	size: 'size',
	litres: 'litres',
	purpose: 'what it is for',
	place: 'where it stands',
	red: 'red bin'
} as const;

const say = (value: unknown) =>
	value === null || value === undefined || value === '' ? 'nothing' : `“${value}”`;

/** What differs, both values of each said. */
function bothSaid(row: BinRow, typed: Partial<BinRow>): string {
	return (Object.keys(FIELDS) as (keyof typeof FIELDS)[])
		.filter((field) => (row[field] ?? null) !== (typed[field] ?? null))
		.map((field) => `${FIELDS[field]} is now ${say(row[field])}, you typed ${say(typed[field])}`)
		.join('; ');
}

async function needFree(tx: Tx, ctx: Context, address: string, id: number): Promise<void> {
	const [other] = await tx
		.select({ id: bin.id })
		.from(bin)
		.where(
			and(
				eq(bin.shopId, ctx.shopId),
				eq(sql`upper(${bin.address})`, address),
				isNull(bin.retiredAt),
				ne(bin.id, id)
			)
		);
	if (other) throw addressTaken(address);
}

export const editBin = (ctx: Context, ref: string, input: BinEdit): Promise<BinView> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await findPlace(tx, ctx, ref, { lock: true });
		if (!row) throw new NotFound();
		const { version, yearlyCostCents, ...rest } = input;
		const typed = { ...rest, litres: rest.litres ?? null, ...addressColumns(input.address) };
		if (row.version !== version)
			throw new Refused(
				'changed',
				`Somebody saved this bin meanwhile: ${bothSaid(row, typed) || 'the same as you typed'}. Look and save again.`
			);
		needOwnerForCost(ctx, yearlyCostCents);
		await needFree(tx, ctx, typed.address, row.id);
		const cost = may(ctx.role, 'run') ? { yearlyCostCents: yearlyCostCents ?? null } : {};
		await tx
			.update(bin)
			.set({ ...typed, ...cost, version: version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, row.id)));
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'edited',
			detail: { ...typed, ...cost }
		});
		return getBin(ctx, typed.address);
	});
