import { lexemesOf } from '$lib/donors/lexemes';
import type { Queued } from '$lib/parts/place';
import type { Wantable } from '$lib/parts/wanted';
import { and, arrayOverlaps, asc, eq, inArray, or, sql } from 'drizzle-orm';
import { bin } from '../bins/tables';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { foundNumber } from '../find/tables';
import { part, proof } from './tables';

/** A part that came off a donor fits what the donor was; old stock says itself what it fits. */
export const fitsEngine = sql<string>`coalesce(nullif(${part.engineKey}, ''), ${donor.engineKey}, '')`;

const rows = {
	id: part.id,
	kind: part.kind,
	grade: part.grade,
	state: part.state,
	engineKey: fitsEngine,
	/** What a want for its engine or its measures is compared with. */
	ownEngine: part.engine,
	donorWords: donor.searchWords,
	words: part.searchWords,
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

/** Parts of these kinds off these engines, or whose engine only the donor knows: by the index, not the whole kind. */
const byEngine = (tx: Tx, ctx: Context, kinds: string[], engines: string[]) =>
	tx
		.select({ id: part.id })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				inArray(part.kind, kinds),
				inArray(part.engineKey, engines.length > 0 ? [...engines, ''] : [])
			)
		);

const byNumber = (tx: Tx, ctx: Context, numbers: string[]) =>
	tx
		.select({ id: foundNumber.partId })
		.from(foundNumber)
		.where(and(eq(foundNumber.shopId, ctx.shopId), inArray(foundNumber.key, numbers)));

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
	const near = byEngine(tx, ctx, kinds, engines).union(byNumber(tx, ctx, numbers));
	return fromParts(tx).where(
		and(
			eq(part.shopId, ctx.shopId),
			inArray(part.id, near),
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

/** A part as wants ask about it. */
export const wantable = (row: VerdictRow): Queued & Wantable => ({
	...queued(row),
	engineWords: row.donorWords ?? lexemesOf(row.ownEngine),
	words: row.words
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
