import type { Verdict } from '../parts/verdict-view';
import { kind } from '../trade';

export type RedNext = 'test' | 'rebuild' | 'scrap';

/** What a rule needs to know of a part in the red bin. */
export interface InRed {
	kind: string;
	verdict: Verdict['verdict'] | null;
	/** Its last test was failed; else it came back or was doubted. */
	failed: boolean;
}

/** What to do next with a part in the red bin, and why. */
export function redNext({ kind: id, verdict, failed }: InRed): { next: RedNext; why: string } {
	const { name, reuse, testMinutes, kitCents } = kind(id);
	if (reuse === 'never') return { next: 'scrap', why: `${name} is never used again.` };
	if (reuse.startsWith('safety') && failed)
		return { next: 'scrap', why: 'A safety part that failed is destroyed.' };
	if (verdict === 'let it go')
		return { next: 'scrap', why: 'Not worth the minutes of another test.' };
	if (!failed) return { next: 'test', why: `Nobody has tested it since: ${testMinutes} minutes.` };
	if (kitCents > 0) return { next: 'rebuild', why: 'It failed: a kit, then the test again.' };
	return { next: 'scrap', why: 'It failed, and there is no kit for it.' };
}
