import type { Plan } from '$lib/find/plan';
import type { NearKind } from '$lib/find/view';
import { findKind, kinds } from '$lib/trade';
import { readInShop, type Context } from '../context';

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

/** The kinds, those that come nearest first, among equals those that are asked for most. */
function nearestFirst(asked: readonly string[], near: readonly string[]): string[] {
	const far = new Map(kinds.map(({ id }) => [id, distance(id, asked, near)]));
	return [...kinds]
		.sort((a, b) => far.get(a.id)! - far.get(b.id)! || b.callsPerYear - a.callsPerYear)
		.map(({ id }) => id);
}

/** The kinds that are on the shelf and come nearest to what was asked, so that no answer is empty. */
export async function nearestKinds(
	ctx: Context,
	plan: Plan,
	kind: string | undefined
): Promise<NearKind[]> {
	const asked = kind ? [kind] : plan.kinds;
	const { near } = await readInShop<{ near: { kind: string; count: number }[] | null }>(
		ctx,
		'find near kinds',
		'find_kinds($2::text[], $3::int) as near',
		[nearestFirst(asked, plan.nearKinds), MOST]
	);
	return (near ?? []).map((row) => ({
		...row,
		kindName: findKind(row.kind)?.name ?? row.kind
	}));
}
