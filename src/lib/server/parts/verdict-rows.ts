import type { Queued } from '$lib/parts/place';
import { and, arrayOverlaps, asc, eq, inArray, or, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part, proof } from './tables';

/** A part that came off a donor fits what the donor was; old stock says itself what it fits. */
export const fitsEngine = sql<string>`coalesce(nullif(${part.engineKey}, ''), ${donor.engineKey}, '')`;

const rows = {
	id: part.id,
	kind: part.kind,
	grade: part.grade,
	state: part.state,
	engineKey: fitsEngine,
	numberKeys: part.numberKeys,
	pulledAt: part.pulledAt,
	massGrams: part.massGrams,
	red: bin.red,
	binCostCents: bin.yearlyCostCents,
	binLitres: bin.litres,
	cause: donor.cause,
	secondCause: donor.secondCause,
	sureness: donor.sureness
};

const fromParts = (tx: Tx) =>
	tx
		.select(rows)
		.from(part)
		.leftJoin(donor, and(eq(donor.shopId, part.shopId), eq(donor.id, part.donorId)))
		.leftJoin(bin, and(eq(bin.shopId, part.shopId), eq(bin.id, part.binId)));

export type VerdictRow = Awaited<ReturnType<typeof fromParts>>[number];

export const rowsOf = (tx: Tx, ctx: Context, partIds: readonly number[]): Promise<VerdictRow[]> =>
	fromParts(tx).where(and(eq(part.shopId, ctx.shopId), inArray(part.id, [...partIds])));

/** What stands in the shop and may answer the same calls as these; the pure rule decides. */
export async function queueFor(
	tx: Tx,
	ctx: Context,
	asked: readonly { kind: string; engineKey: string; numberKeys: readonly string[] }[]
): Promise<VerdictRow[]> {
	const kinds = [...new Set(asked.map(({ kind }) => kind))];
	const engines = [...new Set(asked.map(({ engineKey }) => engineKey))].filter(Boolean);
	const numbers = [...new Set(asked.flatMap(({ numberKeys }) => numberKeys))];
	if (engines.length + numbers.length === 0) return [];
	return fromParts(tx).where(
		and(
			eq(part.shopId, ctx.shopId),
			inArray(part.kind, kinds),
			inArray(part.state, ['pulled', 'shelved']),
			or(
				engines.length > 0 ? inArray(fitsEngine, engines) : undefined,
				numbers.length > 0 ? arrayOverlaps(part.numberKeys, numbers) : undefined
			)
		)
	);
}

export const queued = (row: VerdictRow): Queued => ({
	id: row.id,
	kind: row.kind,
	engineKey: row.engineKey,
	numberKeys: row.numberKeys,
	grade: row.grade,
	state: row.state,
	inRedBin: row.red ?? false,
	pulledAt: row.pulledAt.getTime()
});

/** The proofs of these parts, oldest first. */
export async function proofsOf(tx: Tx, ctx: Context, partIds: readonly number[]) {
	const found = new Map<number, { how: (typeof proof.$inferSelect)['how']; passed: boolean }[]>();
	const rows = await tx
		.select({ partId: proof.partId, how: proof.how, passed: proof.passed })
		.from(proof)
		.where(and(eq(proof.shopId, ctx.shopId), inArray(proof.partId, [...partIds])))
		.orderBy(asc(proof.id));
	for (const { partId, ...how } of rows) found.set(partId, [...(found.get(partId) ?? []), how]);
	return found;
}
