import type { BinItem } from './view';

/** What the shelf view may be shaded by. */
export const SHADES = ['fullness', 'money', 'age'] as const;
export type Shade = (typeof SHADES)[number];

export const SHADE_SAID: Record<Shade, string> = {
	fullness: 'How full',
	money: 'Money per litre',
	age: 'Age of its parts'
};

export const isShade = (word: string | null): word is Shade =>
	SHADES.includes(word as (typeof SHADES)[number]);

/** 0 nothing to shade by, then light, middle, strong. */
export type Level = 0 | 1 | 2 | 3;

/** Where light ends and strong begins. */
export interface Steps {
	middle: number;
	strong: number;
}

const FULL: Steps = { middle: 0.5, strong: 0.95 };
const DAYS: Steps = { middle: 183, strong: 730 };

/** Money has no fixed steps: the shop's own bins in three parts, the emptiest third light. */
export function thirds(figures: readonly number[]): Steps {
	const sorted = figures.filter((one) => one > 0).toSorted((a, b) => a - b);
	const at = (share: number) => sorted[Math.floor(sorted.length * share)] ?? 0;
	return { middle: at(1 / 3), strong: at(2 / 3) };
}

export const levelOf = (figure: number, { middle, strong }: Steps): Level =>
	figure <= 0 ? 0 : figure >= strong ? 3 : figure >= middle ? 2 : 1;

/** The figure of each bin: share of its room, cents a litre, or days; with the steps they fall into. */
export function shading(
	bins: readonly BinItem[],
	by: Shade,
	known: ReadonlyMap<number, number>
): { figures: Map<number, number>; steps: Steps } {
	const figureOf = (bin: BinItem) =>
		by === 'fullness'
			? bin.room.fullness
			: by === 'money'
				? (known.get(bin.id) ?? 0) / bin.room.holds
				: bin.parts > 0
					? Math.max(1, known.get(bin.id) ?? 0)
					: 0;
	const figures = new Map(bins.map((bin) => [bin.id, figureOf(bin)]));
	const steps = by === 'fullness' ? FULL : by === 'age' ? DAYS : thirds([...figures.values()]);
	return { figures, steps };
}
