import { z } from 'zod';

const MOST = 1_000_000;

/** "46", "46.50", "$1,200.00" or "46,50" as a number; null when it is no amount of money. */
export function typedAmount(typed: string): number | null {
	const bare = typed.replace(/[\s\p{Sc}]/gu, '');
	const thousands = bare.includes('.') || /^\d{1,3}(,\d{3})+$/.test(bare);
	const figures = thousands ? bare.replaceAll(',', '') : bare.replace(',', '.');
	return /^\d{1,9}(\.\d{1,3})?$/.test(figures) ? Number(figures) : null;
}

/** How many decimals the currency has. */
const digitsOf = (currency: string): number =>
	new Intl.NumberFormat('en', { style: 'currency', currency }).resolvedOptions()
		.maximumFractionDigits ?? 2;

/** A typed amount in the smallest unit of the currency. */
export const inCents = (amount: number, currency: string): number =>
	Math.round(amount * 10 ** digitsOf(currency));

/** The smallest units of the currency as they are typed into a field. */
export function centsTyped(cents: number | null | undefined, currency: string): string {
	if (cents == null) return '';
	const digits = digitsOf(currency);
	const amount = cents / 10 ** digits;
	return Number.isInteger(amount) ? String(amount) : amount.toFixed(digits);
}

/** An amount typed into a form; `what` names it as its label does. */
export const typedMoney = (what: string) =>
	z.string({ error: `Enter ${what}` }).transform((typed, issues) => {
		const amount = typedAmount(typed);
		if (amount !== null && amount > 0 && amount <= MOST) return amount;
		issues.addIssue(
			amount === null
				? `Enter ${what} as an amount, like 46 or 46.50`
				: `Enter ${what} above 0 and up to 1,000,000`
		);
		return z.NEVER;
	});
