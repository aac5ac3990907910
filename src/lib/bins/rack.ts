import type { BinItem } from './view';

export interface Rack {
	name: string;
	/** How many slots the widest shelf has. */
	slots: number;
	/** The top shelf first, as they hang on the wall; the floor last. */
	shelves: { shelf: number; bins: (BinItem | null)[] }[];
}

const inRack = (bin: BinItem): bin is BinItem & { rack: string; shelf: number; slot: number } =>
	bin.rack !== null && bin.shelf !== null && bin.slot !== null;

/** The bins as they stand: racks by name, and those whose address is not one of a rack. */
export function drawRacks(bins: BinItem[]): { racks: Rack[]; loose: BinItem[] } {
	const placed = bins.filter(inRack);
	const names = [...new Set(placed.map((bin) => bin.rack))].sort();
	const racks = names.map((name) => {
		const own = placed.filter((bin) => bin.rack === name);
		const slots = Math.max(...own.map((bin) => bin.slot));
		const shelves = [...new Set(own.map((bin) => bin.shelf))].sort((a, b) => b - a);
		return {
			name,
			slots,
			shelves: shelves.map((shelf) => ({
				shelf,
				bins: slotsOf(own.filter((bin) => bin.shelf === shelf))
			}))
		};
	});
	return { racks, loose: bins.filter((bin) => !inRack(bin)) };
}

/** The slots of a shelf up to its last bin; far apart ones are not drawn with the gap between them. */
function slotsOf(bins: (BinItem & { slot: number })[]): (BinItem | null)[] {
	const last = Math.max(...bins.map((bin) => bin.slot));
	if (last > 24) return [...bins].sort((a, b) => a.slot - b.slot);
	return Array.from({ length: last }, (_, at) => bins.find((bin) => bin.slot === at + 1) ?? null);
}
