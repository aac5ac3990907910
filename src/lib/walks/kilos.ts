import { usualGrams } from '../bins/nature';
import { findScrapClass, kind, scrapCentsPerGram } from '../trade';

export interface ClassKilos {
	scrapClass: string;
	said: string;
	parts: number;
	grams: number;
	cents: number;
}

/**
 * What parts weigh as scrap, by metal class, the heaviest first. Weighed ones count as weighed, others at
 * the middle of their kind; money at the shop's own price for a kilogram, else at the usual middle.
 */
export function kilosByClass(
	parts: readonly { kind: string; grams: number | null }[],
	kgCents: Readonly<Record<string, number>> = {}
): ClassKilos[] {
	const rows = new Map<string, ClassKilos>();
	for (const part of parts) {
		const { scrapClass } = kind(part.kind);
		const row = rows.get(scrapClass) ?? {
			...{ scrapClass, said: findScrapClass(scrapClass)?.said ?? scrapClass },
			...{ parts: 0, grams: 0, cents: 0 }
		};
		const grams = part.grams ?? usualGrams(kind(part.kind));
		const own = kgCents[scrapClass];
		row.parts += 1;
		row.grams += grams;
		row.cents += grams * (own === undefined ? scrapCentsPerGram(scrapClass) : own / 1000);
		rows.set(scrapClass, row);
	}
	return [...rows.values()]
		.map((row) => ({ ...row, cents: Math.round(row.cents) }))
		.sort((a, b) => b.grams - a.grams || (a.scrapClass < b.scrapClass ? -1 : 1));
}
