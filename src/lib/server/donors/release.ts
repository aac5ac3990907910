import { sayDay } from '$lib/donors/day';
import type { ReleaseInput } from '$lib/donors/input';
import { ROUTE_SAID } from '$lib/donors/words';
import { Refused } from '$lib/refusal';
import { and, eq, sql } from 'drizzle-orm';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { donorRow, todayIn, type DonorRow } from './rows';
import { donor, release } from './tables';

/** A release is added, never changed: the newest stands, the older ones stay to be read. */
export async function addRelease(
	tx: Tx,
	ctx: Context,
	row: DonorRow,
	input: ReleaseInput
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
		shopId: ctx.shopId,
		donorId: row.id,
		route,
		document,
		on,
		holdUntil,
		memberId: ctx.memberId,
		at: ctx.now
	});
	await record(tx, ctx, {
		about: 'donor',
		aboutId: row.id,
		what: `recorded the release: ${ROUTE_SAID[route]}`,
		detail: { route, document, on, holdUntil }
	});
}

export const releaseDonor = (ctx: Context, ref: string, input: ReleaseInput): Promise<void> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const row = await donorRow(tx, ctx, ref, { lock: true });
		await addRelease(tx, ctx, row, input);
		await tx
			.update(donor)
			.set({ version: sql`${donor.version} + 1` })
			.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.id)));
	});
