import type { DonorAccount } from '$lib/yard/view';
import { allocate, carry } from '$lib/worth';
import { and, eq } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import type { DonorRow } from '../donors';
import { partVerdicts } from '../parts';
import { part } from '../parts/tables';

type Row = Pick<typeof part.$inferSelect, 'id' | 'state' | 'outAs' | 'outCents'>;

const READY: readonly Row['state'][] = ['pulled', 'shelved', 'held'];

/** What it cost and brought by now; what was paid is spread over its parts by what they ask. */
export async function accountOf(
	tx: Tx,
	ctx: Context,
	donor: DonorRow,
	scrapCents: number
): Promise<DonorAccount> {
	const rows: Row[] = await tx
		.select({ id: part.id, state: part.state, outAs: part.outAs, outCents: part.outCents })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), eq(part.donorId, donor.id)));
	const kept = rows.filter(({ state }) => state === 'out' || READY.includes(state));
	const ready = kept.filter(({ state }) => state !== 'out');
	const verdicts = await partVerdicts(
		ctx,
		kept.map(({ id }) => id)
	);
	const asked = ({ id, outCents }: Row) => outCents ?? verdicts.get(id)?.askedCents ?? 0;
	const { shares, lossCents } = allocate({
		jointCents: donor.paidCents,
		byProductCents: Math.round(scrapCents),
		parts: kept.map((row) => ({ id: String(row.id), askedCents: asked(row) })),
		method: 'nrv'
	});
	const costs = new Map(shares.map(({ id, cents }) => [Number(id), cents]));
	const sum = (of: Row[], cents: (row: Row) => number) =>
		of.reduce((total, row) => total + cents(row), 0);
	const carried = (row: Row) =>
		carry({ costCents: costs.get(row.id) ?? 0, netRealisableCents: asked(row) }).carriedCents;
	return {
		paidCents: donor.paidCents,
		broughtCents: sum(kept, ({ state, outCents }) => (state === 'out' ? (outCents ?? 0) : 0)),
		sold: kept.filter(({ state, outAs }) => state === 'out' && outAs === 'sold').length,
		fitted: kept.filter(({ state, outAs }) => state === 'out' && outAs === 'fitted').length,
		onShelf: ready.length,
		askedCents: sum(ready, asked),
		carriedCents: sum(ready, carried),
		scrapCents: Math.round(scrapCents),
		lossCents
	};
}
