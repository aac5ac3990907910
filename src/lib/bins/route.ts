export interface Standing {
	address: string;
	rack: string | null;
	shelf: number | null;
	slot: number | null;
	/** Where a place without a rack address stands. */
	place?: string;
}

const inOrder = (a: string, b: string) => a.localeCompare(b, 'en', { numeric: true });
const byAddress = (a: Standing, b: Standing) => inOrder(a.address, b.address);
const inRack = (one: Standing) => one.rack !== null && one.shelf !== null && one.slot !== null;

/** A rack shelf by shelf from the floor up, each shelf back along where the last one ended. */
function alongRack<T extends Standing>(bins: readonly T[]): T[] {
	const shelves = [...new Set(bins.map((bin) => bin.shelf ?? 0))].sort((a, b) => a - b);
	return shelves.flatMap((shelf, at) => {
		const along = bins
			.filter((bin) => bin.shelf === shelf)
			.toSorted((a, b) => (a.slot ?? 0) - (b.slot ?? 0) || byAddress(a, b));
		return at % 2 === 0 ? along : along.reverse();
	});
}

/**
 * The places in the order of a walk: racks by name, each to and fro from the floor up; then the places
 * that are not in a rack, those that stand together one after another.
 */
export function walkingOrder<T extends Standing>(bins: readonly T[]): T[] {
	const placed = bins.filter(inRack);
	const racks = [...new Set(placed.map((bin) => bin.rack ?? ''))].sort(inOrder);
	const loose = bins
		.filter((bin) => !inRack(bin))
		.toSorted((a, b) => inOrder(a.place ?? '', b.place ?? '') || byAddress(a, b));
	return [
		...racks.flatMap((rack) => alongRack(placed.filter((bin) => bin.rack === rack))),
		...loose
	];
}
