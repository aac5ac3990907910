import type { ReleaseInput, TakeIn } from '$lib/donors/input';
import { sayEngine, sayNumber } from '$lib/donors/reference';
import { Refused } from '$lib/refusal';
import { eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import type { KeptPhoto } from '../photos';
import { announceDonor } from './announce';
import { addBoxRow } from './boxes';
import { donorColumns } from './columns';
import { attachPhoto } from './photos';
import { addRelease } from './release';
import { donor } from './tables';

export interface TakenIn {
	id: number;
	number: string;
	tag: string;
	version: number;
}

/** The next running number of the shop; the row's lock keeps two from getting the same. */
async function nextNumber(tx: Tx, ctx: Context): Promise<number> {
	const [row] = await tx
		.update(shop)
		.set({ lastDonorNumber: sql`${shop.lastDonorNumber} + 1` })
		.where(eq(shop.id, ctx.shopId))
		.returning({ number: shop.lastDonorNumber });
	return row!.number;
}

async function addRow(tx: Tx, ctx: Context, input: Omit<TakeIn, 'release' | 'tag'>) {
	const [row] = await tx
		.insert(donor)
		.values({
			...donorColumns(ctx, input),
			shopId: ctx.shopId,
			number: await nextNumber(tx, ctx),
			state: 'whole',
			takenInAt: ctx.now
		})
		.returning();
	return row!;
}

/**
 * Takes in a dead engine: its number, a box with a tag, and what is known by now. A model or a photo of
 * the plate is enough; photos are in the store already.
 */
export const takeIn = (ctx: Context, input: TakeIn, plates: KeptPhoto[] = []): Promise<TakenIn> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		if (!input.model && plates.length === 0)
			throw new Refused('bad input', 'Enter the model, or add a photo of the plate.', 'model');
		const { release, tag: blank, ...known }: TakeIn & { release?: ReleaseInput } = input;
		const row = await addRow(tx, ctx, known);
		const { tag } = await addBoxRow(tx, ctx, row.id, blank);
		await record(tx, ctx, {
			about: 'donor',
			aboutId: row.id,
			what: 'took in',
			toState: 'whole',
			detail: { engine: sayEngine(row), tag }
		});
		await announceDonor(tx, ctx, row.id, true);
		for (const plate of plates) await attachPhoto(tx, ctx, row.id, plate, 'label');
		if (release) await addRelease(tx, ctx, row, release);
		return { id: row.id, number: sayNumber(row.number), tag, version: row.version };
	});
