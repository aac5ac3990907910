import { withHistory } from '$lib/parts/learned';
import type { Observed, ShopFigures } from '$lib/parts/learned-view';
import type { Policy } from '$lib/people/policy';
import { inShop, type Context } from '../context';
import type { Db } from '../db';
import { faultSaid, log } from '../log';
import { observed } from './observed';

const FRESH_MS = 5 * 60 * 1000;
const MOST_SHOPS = 100;

interface Kept {
	seen: Observed;
	readAt: number;
	reading: boolean;
	/** What was last made of it, and by which policy. */
	figures?: { policy: Policy; text: string; made: ShopFigures };
}

/** What was counted of each shop; each process counts anew, so nothing rests on it. */
const kept = new WeakMap<Db, Map<number, Kept>>();

function shopsOf(db: Db): Map<number, Kept> {
	const known = kept.get(db) ?? new Map<number, Kept>();
	kept.set(db, known);
	return known;
}

async function read(ctx: Context): Promise<Kept> {
	const shops = shopsOf(ctx.db);
	const seen = await inShop(ctx, (tx, ctx) => observed(tx, ctx, null));
	const one = { seen, readAt: ctx.now.getTime(), reading: false };
	shops.delete(ctx.shopId);
	shops.set(ctx.shopId, one);
	const [oldest] = shops.keys();
	if (shops.size > MOST_SHOPS && oldest !== undefined) shops.delete(oldest);
	return one;
}

/** Counts anew beside the request that noticed; until it is done the old counts serve. */
function readBeside({ tx: _, ...ctx }: Context, old: Kept): void {
	old.reading = true;
	read(ctx).catch((fault: unknown) => {
		old.reading = false;
		log().warn(faultSaid(fault), 'the history of a shop was not counted');
	});
}

function figuresOf(found: Kept, policy: Policy): ShopFigures {
	if (found.figures?.policy === policy) return found.figures.made;
	const text = JSON.stringify(policy);
	const made = found.figures?.text === text ? found.figures.made : withHistory(policy, found.seen);
	found.figures = { policy, text, made };
	return made;
}

async function recent(ctx: Context): Promise<Kept> {
	const found = shopsOf(ctx.db).get(ctx.shopId) ?? (await read(ctx));
	const age = Math.abs(ctx.now.getTime() - found.readAt);
	if (age > FRESH_MS && !found.reading) readBeside(ctx, found);
	return found;
}

/** What was counted of all kinds, a few minutes ago. */
export const recentlyObserved = async (ctx: Context): Promise<Observed> => (await recent(ctx)).seen;

/**
 * A policy with what the shop's history says of everything, as it was a few minutes ago: for long lists that must
 * come at once. A history moves slowly; a page about one part counts anew.
 */
export const recentFigures = async (ctx: Context, policy: Policy): Promise<ShopFigures> =>
	figuresOf(await recent(ctx), policy);
