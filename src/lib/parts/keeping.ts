import { checklist, kind } from '../trade';

/**
 * Why a part of this kind cannot become stock, in words; null where it can.
 * @param ruined the cause of death ruins the kind
 * @param cause the cause in words, for the reason
 */
export function whyNotStock(kindId: string, ruined: boolean, cause: string): string | null {
	const it = kind(kindId);
	if (it.reuse === 'never') return `${it.name} is never used again: ${it.reason}.`;
	if (ruined) return `${it.name} is ruined by its cause of death: ${cause}.`;
	return null;
}

/** Safety kinds become stock only through their checklist. */
export const asksChecklist = (kindId: string): boolean =>
	['safety-own', 'safety-trade'].includes(kind(kindId).reuse);

/** The lines of the checklist that are not ticked yet. */
export const unticked = (kindId: string, ticked: readonly string[]): string[] =>
	asksChecklist(kindId) ? checklist(kindId).filter((line) => !ticked.includes(line)) : [];
