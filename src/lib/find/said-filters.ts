import { GRADES, type Grade } from '../parts/words';
import type { ProofFilter } from './input';

/** Filters that were said in words: "under 50 tested". */
export interface SaidFilters {
	highCents: number | null;
	lowCents: number | null;
	proof: ProofFilter | null;
	grade: Grade | null;
}

const UNIT = String.raw`(?![\w.,]|\s?(?:cc|hp|mm|cm|in\b|inch|"|v\b|volt|amp|teeth|tooth|kw|minutes?|min\b))`;
const AMOUNT = String.raw`\s?[$€£]?\s?(\d{1,5}(?:[.,]\d{1,2})?)` + UNIT;
const UNDER = new RegExp(
	String.raw`(?:\b(?:under|below|less than|cheaper than|up to|max)|<)` + AMOUNT
);
const OVER = new RegExp(
	String.raw`(?:\b(?:over|above|more than|at least|from)|>)\s?[$€£]\s?(\d{1,5}(?:[.,]\d{1,2})?)` +
		UNIT
);

const PROVED: [RegExp, ProofFilter][] = [
	[/\bbench[- ]test(?:ed)? hot\b|\btested hot\b/, 'bench test hot'],
	[/\bbench[- ]test(?:ed)? cold\b|\btested cold\b/, 'bench test cold'],
	[/\bseen running\b/, 'seen running'],
	[/\bworked in place\b/, 'worked in place'],
	[/\b(?:bench[- ])?tested\b|\bproved\b/, 'tested']
];

const cents = (said: string | undefined) =>
	said === undefined ? null : Math.round(Number(said.replace(',', '.')) * 100);

/** Reads filters off the words. In: lower case. Out: them, and the words without them. */
export function readFilters(text: string): SaidFilters & { rest: string } {
	let rest = text;
	const take = (pattern: RegExp) => {
		const found = pattern.exec(rest);
		if (found) rest = rest.replace(found[0], ' ');
		return found;
	};
	const highCents = cents(take(UNDER)?.[1]);
	const lowCents = cents(take(OVER)?.[1]);
	const grade = GRADES.find((one) => one.length > 5 && take(new RegExp(`\\b${one}\\b`))) ?? null;
	const proof = PROVED.find(([said]) => take(said))?.[1] ?? null;
	return { highCents, lowCents, proof, grade, rest };
}
