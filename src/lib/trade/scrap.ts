import { SCRAP_CLASSES } from './scrap.data';

export { SCRAP_CLASSES };
export type ScrapClass = (typeof SCRAP_CLASSES)[number];

/** The scrap class with this id, or null. */
export function findScrapClass(id: string): ScrapClass | null {
	return SCRAP_CLASSES.find((each) => each.id === id) ?? null;
}

/** Cents for a gram at the middle of the class's range; 0 for a class that nobody pays for. */
export function scrapCentsPerGram(id: string): number {
	const found = findScrapClass(id);
	return found ? (found.lowCentsPerKg + found.highCentsPerKg) / 2000 : 0;
}
