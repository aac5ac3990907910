import type { DonorState } from '$lib/donors/words';
import { and, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { record } from '../people';
import { announceDonor } from './announce';
import type { DonorRow } from './rows';
import { donor } from './tables';

interface Written {
	to: DonorState;
	what: string;
	set: Partial<DonorRow>;
	detail: Record<string, unknown>;
}

/** A donor's step with its event, whose number it returns. */
export async function writeMove(
	tx: Tx,
	ctx: Context,
	row: DonorRow,
	{ to, what, set, detail }: Written
): Promise<number> {
	await tx
		.update(donor)
		.set({ state: to, reviewOn: null, ...set, version: row.version + 1 })
		.where(and(eq(donor.shopId, ctx.shopId), eq(donor.id, row.id)));
	if (['stripped', 'gone'].includes(row.state)) await announceDonor(tx, ctx, row.id, true);
	return record(tx, ctx, {
		about: 'donor',
		aboutId: row.id,
		what,
		fromState: row.state,
		toState: to,
		detail
	});
}
