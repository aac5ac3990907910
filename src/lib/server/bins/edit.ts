import type { BinEdit } from '$lib/bins/input';
import type { BinView } from '$lib/bins/view';
import { may } from '$lib/people/role';
import { NotFound, Refused } from '$lib/refusal';
import { and, eq } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import { alone } from '../db/alone';
import { allow, record } from '../people';
import { addressColumns, addressTaken, needOwnerForCost } from './add';
import { findPlace, type BinRow } from './find-place';
import { getBin } from './queries';
import { bin } from './tables';

const FIELDS = {
	address: 'address',
	size: 'size',
	litres: 'litres',
	loadKg: 'what it may carry',
	uses: 'what it is kept for',
	kinds: 'the kinds that belong here',
	purpose: 'what it is for',
	place: 'where it stands',
	red: 'red bin'
} as const;

const plain = (value: unknown) => (Array.isArray(value) ? value.join(', ') : String(value ?? ''));
const say = (value: unknown) => (plain(value) === '' ? 'nothing' : `“${plain(value)}”`);

const differing = (row: BinRow, typed: Partial<BinRow>) =>
	(Object.keys(FIELDS) as (keyof typeof FIELDS)[]).filter(
		(field) => typed[field] !== undefined && plain(row[field]) !== plain(typed[field])
	);

/** What differs, both values of each said. */
function bothSaid(row: BinRow, typed: Partial<BinRow>): string {
	return differing(row, typed)
		.map((field) => `${FIELDS[field]} is now ${say(row[field])}, you typed ${say(typed[field])}`)
		.join('; ');
}

/** What stood there before, of all that changed. */
const stoodBefore = (row: BinRow, set: Partial<BinRow>) =>
	Object.fromEntries(
		(Object.keys(set) as (keyof BinRow)[])
			.filter((key) => set[key] !== undefined && plain(set[key]) !== plain(row[key]))
			.map((key) => [key, row[key]])
	);

export const editBin = (ctx: Context, ref: string, input: BinEdit): Promise<BinView> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await findPlace(tx, ctx, ref, 'no key update');
		if (!row) throw new NotFound();
		const { version, yearlyCostCents, ...rest } = input;
		const typed = { ...rest, ...addressColumns(input.address) };
		if (row.version !== version)
			throw new Refused(
				'changed',
				`Somebody saved this bin meanwhile: ${bothSaid(row, typed) || 'the same as you typed'}. Look and save again.`
			);
		needOwnerForCost(ctx, yearlyCostCents);
		const cost = may(ctx.role, 'run') ? { yearlyCostCents: yearlyCostCents ?? null } : {};
		const saved = tx
			.update(bin)
			.set({ ...typed, ...cost, version: version + 1 })
			.where(and(eq(bin.shopId, ctx.shopId), eq(bin.id, row.id)));
		await alone(saved, 'bin_address', addressTaken(typed.address));
		await record(tx, ctx, {
			about: 'bin',
			aboutId: row.id,
			what: 'edited',
			detail: { ...typed, ...cost, before: stoodBefore(row, { ...typed, ...cost }) }
		});
		return getBin(ctx, typed.address);
	});
