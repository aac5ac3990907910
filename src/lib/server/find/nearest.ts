import type { Plan } from '$lib/find/plan';
import type { NearKind } from '$lib/find/view';
import { findKind } from '$lib/trade';
import { and, count, eq, inArray } from 'drizzle-orm';
import type { Context } from '../context';
import type { Tx } from '../db';
import { part } from '../parts/tables';

const MOST = 6;

/** How near a kind comes to what was asked: by spelling, as a piece of it, in the same system, or not at all. */
function distance(id: string, asked: readonly string[], near: readonly string[]): number {
	if (asked.includes(id)) return 0;
	if (near.includes(id)) return 1;
	const here = findKind(id);
	const others = asked.concat(near).map(findKind);
	const kin = others.some((other) => other && (other.partOf === id || here?.partOf === other.id));
	if (kin) return 2;
	return others.some((other) => other?.system === here?.system) ? 3 : 4;
}

/** The kinds that are on the shelf and come nearest to what was asked, so that no answer is empty. */
export async function nearestKinds(
	tx: Tx,
	ctx: Context,
	plan: Plan,
	kind: string | undefined
): Promise<NearKind[]> {
	const asked = kind ? [kind] : plan.kinds;
	const rows = await tx
		.select({ kind: part.kind, count: count() })
		.from(part)
		.where(and(eq(part.shopId, ctx.shopId), inArray(part.state, ['shelved', 'pulled'])))
		.groupBy(part.kind);
	return rows
		.map((row) => ({ ...row, far: distance(row.kind, asked, plan.nearKinds) }))
		.sort((a, b) => a.far - b.far || b.count - a.count || a.kind.localeCompare(b.kind))
		.slice(0, MOST)
		.map(({ kind, count }) => ({ kind, kindName: findKind(kind)?.name ?? kind, count }));
}
