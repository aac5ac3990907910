import { whereTo } from '$lib/bins/where-to';
import { and, asc, eq, inArray, isNotNull, isNull, notExists, or, sql } from 'drizzle-orm';
import { redBin, shelves } from '../bins';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';
import { walk, walkStop } from './tables';

/** A stop to be: which part, at which bin, and why. */
export interface ToDo {
	partId: number | null;
	binId: number | null;
	why: string;
}

/** Not on the list of a walk of this sort that still goes on. */
const notOn = (tx: Tx, ctx: Context, what: 'put away' | 'fetch' | 'purge') =>
	notExists(
		tx
			.select({ n: walkStop.n })
			.from(walkStop)
			.innerJoin(walk, and(eq(walk.shopId, walkStop.shopId), eq(walk.id, walkStop.walkId)))
			.where(
				and(
					eq(walkStop.shopId, ctx.shopId),
					eq(walkStop.partId, part.id),
					eq(walk.what, what),
					isNull(walk.endedAt),
					isNull(walkStop.outcome)
				)
			)
	);

/** Pulled, or in doubt, and lying nowhere yet. */
export const toPutAway = (tx: Tx, ctx: Context) =>
	tx
		.select({ id: part.id, kind: part.kind, state: part.state, grams: part.massGrams })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				inArray(part.state, ['pulled', 'back']),
				isNull(part.binId),
				isNull(part.boxId),
				notOn(tx, ctx, 'put away')
			)
		)
		.orderBy(asc(part.kind), asc(part.pulledAt), asc(part.id));

/** Each with the best place for it, counted as if those before it lay there already. */
export async function putAwayStops(tx: Tx, ctx: Context): Promise<ToDo[]> {
	const bins = (await shelves(tx, ctx)).map((bin) => ({ ...bin, contents: [...bin.contents] }));
	const red = await redBin(tx, ctx);
	return (await toPutAway(tx, ctx)).map(({ id, kind, state, grams }) => {
		if (state === 'back') return { partId: id, binId: red?.id ?? null, why: 'failed or in doubt' };
		const [best] = whereTo({ kind, grams }, bins, 1);
		const bin = bins.find((one) => one.address === best?.address);
		bin?.contents.push({ kind, count: 1, grams: grams ?? 0 });
		return { partId: id, binId: bin?.id ?? null, why: best?.why ?? '' };
	});
}

const alreadyFetched = (tx: Tx, ctx: Context) =>
	tx
		.select({ n: walkStop.n })
		.from(walkStop)
		.innerJoin(walk, and(eq(walk.shopId, walkStop.shopId), eq(walk.id, walkStop.walkId)))
		.where(
			and(
				eq(walkStop.shopId, ctx.shopId),
				eq(walkStop.partId, part.id),
				eq(walk.what, 'fetch'),
				eq(walkStop.outcome, 'found'),
				sql`${walkStop.at} >= ${part.changedAt}`
			)
		);

/** Held for somebody, put away, and not fetched yet. */
export const toFetch = (tx: Tx, ctx: Context, who?: string) =>
	tx
		.select({ id: part.id, binId: part.binId, heldFor: part.heldFor })
		.from(part)
		.where(
			and(
				eq(part.shopId, ctx.shopId),
				eq(part.state, 'held'),
				or(isNotNull(part.binId), isNotNull(part.boxId)),
				who ? eq(part.heldFor, who) : undefined,
				notOn(tx, ctx, 'fetch'),
				notExists(alreadyFetched(tx, ctx))
			)
		)
		.orderBy(asc(part.id));

export const fetchStops = async (tx: Tx, ctx: Context, who?: string): Promise<ToDo[]> =>
	(await toFetch(tx, ctx, who)).map(({ id, binId, heldFor }) => ({
		...{ partId: id, binId },
		why: `held for ${heldFor}`
	}));
