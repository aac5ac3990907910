import { tokensOf } from '../donors/lexemes';
import { readSearch } from '../find/plan';
import { findKind } from '../trade';

/** What a want asks for, as its form starts. */
export interface AsksFor {
	kind: string;
	engine: string;
	measures: string;
	numbers: string[];
}

const isMeasure = (said: string) =>
	tokensOf(said).every(({ is }) => is === 'size' || is === 'amount');

/**
 * What was looked for in vain, as a want: the kind, the engine, what was measured, the number.
 * In: the words of the search and the kind it was narrowed to. Out: nothing twice, nothing that was not said.
 */
export function asksOf(q: string, kind = ''): AsksFor {
	const plan = readSearch(q);
	const named = findKind(kind)?.id ?? (plan.kinds.length === 1 ? plan.kinds[0]! : '');
	const isNumber = plan.numberKey !== null && plan.kinds.length === 0 && /\d/.test(plan.text);
	if (isNumber && !named) return { kind: '', engine: '', measures: '', numbers: [plan.text] };
	const measures = plan.words.filter(isMeasure);
	return {
		kind: named,
		engine: plan.words.filter((word) => !isMeasure(word)).join(' '),
		measures: measures.join(', '),
		numbers: []
	};
}

/** A kind without what its name says in brackets. */
export const kindSaid = (kind: string): string =>
	(findKind(kind)?.name ?? kind).replace(/ \([^)]*\)/g, '');

/** "Recoil starter assembly for Ondrake TARN-21L, 40 mm", in the words of the counter. */
export function whatSaid({ kind, engine, measures, numbers }: AsksFor): string {
	const first = kind ? kindSaid(kind) : `Part ${numbers.join(', ')}`;
	const rest = [measures, kind ? numbers.join(', ') : ''].filter(Boolean);
	return [`${first}${engine ? ` for ${engine}` : ''}`, ...rest].join(', ');
}
