import { inCents, typedAmount } from '$lib/people/typed-money';
import { SEASONS } from '$lib/people/settings';
import { CAUSES } from '$lib/trade';
import { z } from 'zod';
import { grade, kindId } from './typed';

const MOST = 1_000_000;

const amount = (label: string) =>
	z.string().transform((typed, issues) => {
		const typedIn = typedAmount(typed);
		if (typedIn !== null && typedIn > 0 && typedIn <= MOST) return typedIn;
		issues.addIssue(`Enter “${label}” as an amount above 0, like 46 or 46.50`);
		return z.NEVER;
	});

const causes = CAUSES.map(({ id }) => id);

/** What the calculator is asked, as its page's address carries it; empty fields are absent. */
const Asked = z.object({
	kind: kindId,
	cause: z.enum(causes, { error: 'Choose the cause of death from the list' }).default('unknown'),
	grade: grade.default('untested'),
	new: amount('Price of a new one').optional(),
	copy: amount('Price of a copy').optional(),
	have: z.coerce
		.number({ error: 'Enter how many there are as a whole number' })
		.int('Enter how many there are as a whole number')
		.min(0, 'Enter how many there are, 0 or more')
		.max(1000, 'Enter how many there are, up to 1000')
		.default(0),
	where: z.enum(['off', 'on'], { error: 'Choose where it is' }).default('off'),
	season: z.enum(SEASONS, { error: 'Choose the season' }).optional()
});

/** A part that is not logged, as far as its worth depends on it. */
export interface Calculation {
	kind: string;
	cause: (typeof CAUSES)[number]['id'];
	grade: z.output<typeof grade>;
	newCents: number | null;
	copyCents: number | null;
	/** How many of them there are already. */
	have: number;
	stillOn: boolean;
	/** Null: the season of the shop. */
	season: (typeof SEASONS)[number] | null;
}

interface Problem {
	field: string;
	message: string;
}

/** Reads the address of the calculator: nothing asked yet, what was asked, or what to put right. */
export function askedIn(
	address: URLSearchParams,
	currency: string
): { asked: Calculation | null; problems: Problem[] } {
	if (!address.has('kind')) return { asked: null, problems: [] };
	const filled = [...address].filter(([, typed]) => typed.trim() !== '');
	const read = Asked.safeParse(Object.fromEntries(filled));
	if (!read.success)
		return {
			asked: null,
			problems: read.error.issues.map(({ path, message }) => ({ field: String(path[0]), message }))
		};
	const { new: ofNew, copy, where, season, ...rest } = read.data;
	const cents = (typed?: number) => (typed === undefined ? null : inCents(typed, currency));
	return {
		asked: {
			...rest,
			newCents: cents(ofNew),
			copyCents: cents(copy),
			stillOn: where === 'on',
			season: season ?? null
		},
		problems: []
	};
}
