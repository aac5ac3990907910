import { ageClock } from '$lib/bins/age';
import { NotFound } from '$lib/refusal';
import { kind } from '$lib/trade';
import { kilosByClass } from '$lib/walks/kilos';
import type { WalkPlace, WalkStop, WalkView } from '$lib/walks/view';
import { OUTCOMES } from '$lib/walks/words';
import { and, asc, eq } from 'drizzle-orm';
import { bin } from '../bins/tables';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { partsByIds } from '../parts';
import { part } from '../parts/tables';
import { getPolicy } from '../people';
import { member } from '../people/tables';
import { walkItems } from './list';
import { ofWalk, stopsOf } from './rows';
import { walkStop } from './tables';

const stopRows = (tx: Tx, ctx: Context, id: number) =>
	tx
		.select({ stop: walkStop, bin, part, by: member.name })
		.from(walkStop)
		.leftJoin(bin, and(eq(bin.shopId, walkStop.shopId), eq(bin.id, walkStop.binId)))
		.leftJoin(part, and(eq(part.shopId, walkStop.shopId), eq(part.id, walkStop.partId)))
		.leftJoin(member, and(eq(member.shopId, walkStop.shopId), eq(member.id, walkStop.memberId)))
		.where(stopsOf(ctx, id))
		.orderBy(asc(walkStop.n));
type Row = Awaited<ReturnType<typeof stopRows>>[number];

/** The places of a walk as they come, with how much is still to be answered at each. */
function placesOf(rows: readonly Row[]): WalkPlace[] {
	const places = new Map<number, WalkPlace>();
	for (const { stop, bin: at } of rows) {
		const id = stop.binId ?? 0;
		const place = places.get(id) ?? {
			...{ id, address: at?.address ?? null, place: at?.place ?? '', red: at?.red ?? false },
			...{ total: 0, open: 0 }
		};
		place.total += 1;
		place.open += stop.outcome === null ? 1 : 0;
		places.set(id, place);
	}
	return [...places.values()];
}

async function shown(ctx: Context, rows: readonly Row[]): Promise<WalkStop[]> {
	const ids = rows.flatMap((row) => (row.part ? [row.part.id] : []));
	const items = new Map((await partsByIds(ctx, ids)).map((item) => [item.id, item]));
	return rows.map(({ stop, part: row, by }) => ({
		...{ n: stop.n, why: stop.why, outcome: stop.outcome, note: stop.note, by, at: stop.at },
		part: row ? (items.get(row.id) ?? null) : null,
		kindName: row ? kind(row.kind).name : '',
		tag: row?.tag ?? null,
		age: row ? ageClock(row.kind, row.pulledAt, null, ctx.now) : null
	}));
}

/** A purge in kilos: what was scrapped, or before anything was, what is on the list. */
async function kilosOf(ctx: Context, rows: readonly Row[]) {
	const scrapped = rows.filter((row) => row.stop.outcome === 'scrapped');
	const counted = (scrapped.length > 0 ? scrapped : rows).flatMap(({ part: row }) =>
		row ? [{ kind: row.kind, grams: row.massGrams }] : []
	);
	return kilosByClass(counted, (await getPolicy(ctx)).scrapKgCents);
}

const tallyOf = (rows: readonly Row[]) =>
	OUTCOMES.map((outcome) => ({
		outcome,
		count: rows.filter((row) => row.stop.outcome === outcome).length
	})).filter(({ count }) => count > 0);

/**
 * A walk with the stops of one place: the one that is asked for, else the first where something is open.
 * Of a walk that is over, all stops.
 */
export const getWalk = (ctx: Context, id: number, at?: number): Promise<WalkView> =>
	inShop(ctx, async (tx, ctx) => {
		const [walk] = await walkItems(tx).where(ofWalk(ctx, id));
		if (!walk) throw new NotFound();
		const rows = await stopRows(tx, ctx, id);
		const places = placesOf(rows);
		const asked = places.find((place) => place.id === at);
		const place = walk.endedAt ? null : (asked ?? places.find((one) => one.open > 0) ?? null);
		const here = place ? rows.filter((row) => (row.stop.binId ?? 0) === place.id) : rows;
		return {
			...walk,
			...{ places, at: place, stops: await shown(ctx, here), tally: tallyOf(rows) },
			kilos: walk.what === 'purge' ? await kilosOf(ctx, rows) : []
		};
	});
