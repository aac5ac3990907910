import { money, percent } from '$lib/format';
import type { TermUnit, Verdict, VerdictTerm } from './verdict-view';

type Say = (cents: number) => string;

/** The gain in words, against scrapping it now. */
export function gainSaid({ gainCents }: Pick<Verdict, 'gainCents'>, say: Say): string | null {
	if (gainCents === null) return null;
	if (gainCents < 0) return `loses ${say(-gainCents)} against scrapping it now`;
	return `gains ${say(gainCents)} over scrapping it now`;
}

/** When the cleaning and testing pays; null for a part that is let go or has nothing left to do. */
export function timingSaid({
	verdict,
	timing
}: Pick<Verdict, 'verdict' | 'timing'>): string | null {
	if (timing === null || (verdict !== 'keep' && verdict !== 'close call')) return null;
	return timing === 'now' ? 'Clean and test it today.' : 'Clean and test it when somebody calls.';
}

/** How many of these to keep, and how many there are to hand out: one in the red bin or held is none. */
export function keepSaid({ gainCents, keepUpTo, have }: Verdict): string | null {
	if (gainCents === null) return null;
	if (keepUpTo === null) return `Keep all that come in: ${have} to hand out.`;
	return keepUpTo === 0
		? `Keep none: ${have} to hand out.`
		: `Keep up to ${keepUpTo}: ${have} to hand out.`;
}

/** From which price of a new one keeping pays. */
export function evenSaid(verdict: Verdict, say: Say): string | null {
	if (verdict.verdict === 'never') return null;
	if (verdict.copyBinds && verdict.copyCents !== null)
		return `No new price makes it pay while the copy costs ${say(verdict.copyCents)}.`;
	if (verdict.breakEvenNewCents === null) return 'No price of a new one makes it pay.';
	const over = say(verdict.breakEvenNewCents);
	return verdict.verdict === 'needs a price'
		? `Worth keeping if a new one costs over ${over}.`
		: `Pays from a new price of ${over}.`;
}

const inTime = (years: number): string => {
	if (years < 1 / 12) return 'under a month';
	if (years < 2) return `${Math.round(years * 12)} months`;
	return `${years.toFixed(years < 10 ? 1 : 0)} years`;
};

/** How long it will lie there, and whether anybody ever calls. */
export function waitSaid({ waitYears, everCalled, verdict }: Verdict): string | null {
	if (verdict === 'never' || everCalled === null) return null;
	if (waitYears === null) return 'Nobody calls for it.';
	return `Expected wait ${inTime(waitYears)}; ${percent(everCalled)} of such parts are ever called for.`;
}

/** What else should be known before it goes back on the shelf. */
export function remarks(verdict: Verdict, say: Say): string[] {
	const said: string[] = [];
	if (verdict.untestedCents !== null)
		said.push(
			`Priced as ${verdict.askedGrade}, once it passes its test. Sold untested it fetches ${say(verdict.untestedCents)}.`
		);
	if (verdict.stale) said.push('The price is old: look again what a new one costs.');
	if (verdict.belowLeast)
		said.push('Under the least price of the counter: for the tray or for own use.');
	return said;
}

const plain = (digits: number) => new Intl.NumberFormat('en-US', { maximumFractionDigits: digits });

/** A figure of the sum for people to read. */
export function termSaid(
	{ value, unit }: Pick<VerdictTerm, 'value' | 'unit'>,
	currency: string
): string {
	const cents = () => money(Math.round(value), currency);
	const said: Record<TermUnit, () => string> = {
		cents,
		'cents an hour': () => `${cents()} an hour`,
		'cents a year': () => `${cents()} a year`,
		'cents a kilogram': () => `${cents()} a kg`,
		share: () => percent(value, 'en-US', 1),
		'share a year': () => `${percent(value, 'en-US', 1)} a year`,
		'a year': () => `${plain(2).format(value)} a year`,
		minutes: () => `${plain(1).format(value)} min`,
		grams: () => `${plain(0).format(value)} g`,
		count: () => plain(0).format(value)
	};
	return said[unit]();
}
