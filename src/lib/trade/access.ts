import { kind } from './kind';

/**
 * The kinds in an order in which they can come off: what stands before a part comes before it.
 * In: ids of the kinds that are there; otherwise their given order is kept. Two kinds that name
 * each other are taken as they come. Throws RangeError on an unknown id.
 */
export function accessOrder(kindIds: readonly string[]): string[] {
	const present = new Set(kindIds);
	const order: string[] = [];
	const seen = new Set<string>();
	const visit = (id: string) => {
		if (seen.has(id)) return;
		seen.add(id);
		kind(id)
			.behind.filter((before) => present.has(before))
			.forEach(visit);
		order.push(id);
	};
	kindIds.forEach(visit);
	return order;
}

/** What must come off before this kind, as far as it is there, in an order that works. */
export function standsBefore(kindId: string, presentKindIds: readonly string[]): string[] {
	const present = new Set(presentKindIds);
	const wanted = new Set<string>();
	const collect = (id: string) => {
		for (const before of kind(id).behind) {
			if (before === kindId || wanted.has(before) || !present.has(before)) continue;
			wanted.add(before);
			collect(before);
		}
	};
	collect(kindId);
	return accessOrder([...wanted]);
}

/**
 * Minutes to get one part off: its own and those of everything that still stands before it.
 * In: its id and the ids of the kinds still on this donor. Out: bench minutes. Throws RangeError on
 * an unknown id.
 */
export function minutesToPull(kindId: string, presentKindIds: readonly string[]): number {
	return standsBefore(kindId, presentKindIds).reduce(
		(minutes, id) => minutes + kind(id).pullMinutes,
		kind(kindId).pullMinutes
	);
}
