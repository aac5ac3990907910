import { sayDay } from '$lib/donors/day';
import type { ReleaseInput } from '$lib/donors/input';
import { sayEngine } from '$lib/donors/reference';
import { ROUTE_SAID } from '$lib/donors/words';
import { Refused } from '$lib/refusal';
import { and, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { shop } from '../people/tables';
import { addPhotoRow, type KeptPhoto } from '../photos';
import { donorRow, todayIn, type DonorRow } from './rows';
import { donor, release } from './tables';

/** The next number of the register; the row's lock keeps two from getting the same. */
async function nextNumber(tx: Tx, ctx: Context): Promise<number> {
	const [row] = await tx
		.update(shop)
		.set({ lastReleaseNumber: sql`${shop.lastReleaseNumber} + 1` })
		.where(eq(shop.id, ctx.shopId))
		.returning({ number: shop.lastReleaseNumber });
	return row!.number;
}

/** A release is added, never changed: the newest stands, the older ones stay to be read. */
export async function addRelease(
	tx: Tx,
	ctx: Context,
	row: DonorRow,
	input: ReleaseInput,
	photoId: number | null = null
): Promise<void> {
	const today = await todayIn(ctx);
	const on = input.on ?? today;
	if (on > today)
		throw new Refused(
			'bad input',
			`Enter a day of the release up to today, ${sayDay(today, today)}.`,
			'on'
		);
	const { route, document, holdUntil = null } = input;
	await tx.insert(release).values({
		...input,
		...{ shopId: ctx.shopId, donorId: row.id, memberId: ctx.memberId, at: ctx.now },
		...{ on, holdUntil, photoId, number: await nextNumber(tx, ctx) },
		...{ engine: sayEngine(row), serial: row.serial }
	});
	await record(tx, ctx, {
		about: 'donor',
		aboutId: row.id,
		what: `recorded the release: ${ROUTE_SAID[route]}`,
		detail: { route, document, on, holdUntil }
	});
}

/** Records why the shop may take it apart; with a picture of the signature or of the signed paper, where there is one. */
export const releaseDonor = (
	ctx: Context,
	ref: string,
	input: ReleaseInput,
	paper?: KeptPhoto
): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		const photo = paper && (await addPhotoRow(ctx, paper));
		await addRelease(tx, ctx, row, input, photo?.id);
		await tx
			.update(donor)
			.set({ version: sql`${donor.version} + 1`, gateOverruled: false })
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.id)));
	});
