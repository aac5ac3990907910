import { walkingOrder } from '$lib/bins/route';
import { Refused } from '$lib/refusal';
import type { StartWalk } from '$lib/walks/input';
import type { WalkWhat } from '$lib/walks/words';
import { shelves } from '../bins';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { allow, record } from '../people';
import { purgeStops } from './to-purge';
import { walk, walkStop } from './tables';
import { countStops } from './to-count';
import { fetchStops, putAwayStops, type ToDo } from './to-walk';

const STOPS: Record<WalkWhat, (tx: Tx, ctx: Context, who?: string) => Promise<ToDo[]>> = {
	'put away': putAwayStops,
	fetch: fetchStops,
	count: countStops,
	purge: purgeStops
};

const NOTHING: Record<WalkWhat, string> = {
	'put away': 'Nothing waits to be put away.',
	fetch: 'Nothing that is held waits to be fetched.',
	count: 'Every bin is on a count that still goes on, or there is no bin yet.',
	purge: 'Nothing is to be purged: what lies there is called for, or is worth its place.'
};

/** In walking order; what has no place comes last. */
async function inRoute(tx: Tx, ctx: Context, stops: readonly ToDo[]): Promise<ToDo[]> {
	const order = walkingOrder(await shelves(tx, ctx)).map(({ id }) => id);
	const at = ({ binId }: ToDo) => {
		const found = order.indexOf(binId ?? -1);
		return found < 0 ? order.length : found;
	};
	return stops.toSorted((a, b) => at(a) - at(b));
}

/** Begins a walk: what there is to do, as stops in walking order. Returns its number. */
export const startWalk = (ctx: Context, input: StartWalk): Promise<{ id: number }> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const stops = await inRoute(tx, ctx, await STOPS[input.what](tx, ctx, input.for));
		if (stops.length === 0) throw new Refused('gate', NOTHING[input.what]);
		const { shopId, memberId, now } = ctx;
		const [row] = await tx
			.insert(walk)
			.values({ shopId, what: input.what, startedBy: memberId, startedAt: now })
			.returning({ id: walk.id });
		const id = row!.id;
		await tx
			.insert(walkStop)
			.values(stops.map((stop, at) => ({ ...stop, shopId, walkId: id, n: at + 1 })));
		const detail = { walk: input.what, stops: stops.length };
		await record(tx, ctx, { about: 'walk', aboutId: id, what: 'started', toState: 'open', detail });
		return { id };
	});
