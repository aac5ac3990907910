import { keepCleaning } from '$lib/worth';

export interface CleaningFacts {
	/** Before any cleaning: what its donor's death left of its kind. */
	chance: number;
	/** How many tests that chance is worth. */
	weight: number;
	attempts: number;
	/** Attempts in a row that did not help. */
	failures: number;
	/** Asked once it works; null without a price. */
	askedCents: number | null;
	scrapCents: number;
	/** Cleaning and testing, once. */
	minutes: number;
	labourHourCents: number;
}

/** Whether one more attempt at cleaning pays, as a page shows it. */
export interface CleaningView {
	attempts: number;
	failures: number;
	attemptCents: number;
	/** Null without a price. */
	advice: { go: boolean; inHandCents: number; stopAfter: number | null } | null;
}

/**
 * The stop rule on one part: the chance that its kind comes right starts where its donor's death left it
 * and falls with every failed attempt; what it is worth more is what it is asked for, less its scrap.
 * In: chance 0 to 1, counts, cents, minutes. Out: attempts, and whether to go on.
 */
export function cleaningOf(facts: CleaningFacts): CleaningView {
	const { chance, weight, attempts, failures, askedCents, scrapCents, minutes } = facts;
	const attemptCents = (minutes * facts.labourHourCents) / 60;
	const base = { attempts, failures, attemptCents: Math.round(attemptCents) };
	if (askedCents === null) return { ...base, advice: null };
	const least = 0.001;
	const advice = keepCleaning({
		alpha: Math.max(chance * weight, least),
		beta: Math.max((1 - chance) * weight, least),
		failures,
		worthCents: Math.max(askedCents - scrapCents, 0),
		attemptCents
	});
	return { ...base, advice };
}

/** The rule in words. */
export function cleaningSaid(
	{ failures, attemptCents, advice }: CleaningView,
	say: (cents: number) => string
): string {
	if (!advice) return 'With a price it can be said when to stop.';
	const cost = `One more costs ${say(attemptCents)} of minutes`;
	if (advice.go) return `${cost} and leaves ${say(advice.inHandCents)} in hand, on average.`;
	return failures > 0
		? `Stop: ${cost.toLowerCase()} and loses ${say(-advice.inHandCents)}, on average. Fit another.`
		: `Cleaning does not pay: it costs ${say(attemptCents)} of minutes and loses ${say(-advice.inHandCents)}, on average.`;
}
