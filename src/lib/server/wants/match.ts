import type { Wanted } from '$lib/parts/wanted';
import { findKind } from '$lib/trade';
import { and, arrayOverlaps, eq, inArray, isNull, or, sql } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { donor } from '../donors/tables';
import { part } from '../parts/tables';
import type { WantRow } from './rows';
import { keep, type Coming, type Found } from './keep';
import { fitBy, fitNotes, replacedKeys } from './notes';
import { want } from './tables';
import { donorThings, onDonor, partThings, type DonorThing } from './things';

/** A want does not need more to choose from. */
const MOST = 40;

const best = (found: Found[]) => found.sort((a, b) => a.rank - b.rank).slice(0, MOST);

/** A want against everything that is here. */
export async function matchWant(
	tx: Tx,
	ctx: Context,
	row: WantRow,
	coming: Coming
): Promise<number> {
	const keys = await replacedKeys(tx, ctx, row.numberKeys, 'answering');
	const asked: Wanted = { ...row, numberKeys: keys };
	const notes = await fitNotes(tx, ctx, row.kind ? [row.kind] : []);
	const numbered = keys.length > 0 ? arrayOverlaps(part.numberKeys, keys) : undefined;
	const things = await partThings(tx, ctx, row.kind ? eq(part.kind, row.kind) : numbered);
	const parts = things.flatMap((thing): Found[] => {
		const rank = fitBy(asked, thing, notes);
		return rank ? [{ wantId: row.id, partId: thing.id, rank }] : [];
	});
	const classes = findKind(row.kind)?.on ?? [];
	const dead =
		classes.length > 0 ? await donorThings(tx, ctx, inArray(donor.engineClass, [...classes])) : [];
	const donors = dead.flatMap((thing): Found[] => {
		if (!thing.kinds.includes(row.kind)) return [];
		const rank = fitBy(asked, onDonor(thing, row.kind), notes);
		return rank ? [{ wantId: row.id, donorId: thing.id, rank }] : [];
	});
	const found = [...best(parts), ...best(donors)];
	await keep(tx, ctx, found, coming);
	return found.length;
}

const lookedOut = (ctx: Context) =>
	and(
		eq(want.shopId, ctx.shopId),
		inArray(want.state, ['waiting', 'told', 'said yes']),
		isNull(want.partId)
	);

/** A part that came in against those who wait. Returns the wants to which it is new. */
export async function matchPart(tx: Tx, ctx: Context, partId: number, coming: Coming) {
	const [own] = await partThings(tx, ctx, eq(part.id, partId));
	if (!own) return [];
	const thing = { ...own, numberKeys: await replacedKeys(tx, ctx, own.numberKeys, 'answered by') };
	const rows = await tx
		.select()
		.from(want)
		.where(
			and(
				lookedOut(ctx),
				or(
					eq(want.kind, thing.kind),
					and(eq(want.kind, ''), sql`cardinality(${want.numberKeys}) > 0`)
				)
			)
		);
	const notes = rows.length > 0 ? await fitNotes(tx, ctx, [thing.kind]) : [];
	const found = rows.flatMap((row): Found[] => {
		const rank = fitBy(row, thing, notes);
		return rank ? [{ wantId: row.id, partId, rank }] : [];
	});
	return keep(tx, ctx, found, coming);
}

function onIt(thing: DonorThing, row: WantRow, notes: Parameters<typeof fitBy>[2]): Found[] {
	const rank = fitBy(row, onDonor(thing, row.kind), notes);
	return rank ? [{ wantId: row.id, donorId: thing.id, rank }] : [];
}

/** A donor that came in, or of which more is known, against those who wait for what it carries. */
export async function matchDonor(tx: Tx, ctx: Context, donorId: number, coming: Coming) {
	const [thing] = await donorThings(tx, ctx, eq(donor.id, donorId));
	if (!thing || thing.kinds.length === 0) return [];
	const rows = await tx
		.select()
		.from(want)
		.where(and(lookedOut(ctx), inArray(want.kind, thing.kinds)));
	const kinds = rows.map(({ kind }) => kind);
	const notes = rows.length > 0 ? await fitNotes(tx, ctx, kinds) : [];
	const found = rows.flatMap((row) => onIt(thing, row, notes));
	return keep(tx, ctx, found, coming);
}
