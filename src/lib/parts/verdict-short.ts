import type { Season } from '$lib/people/settings';
import { gainCents, verdictWord } from '$lib/worth';
import type { ShopFigures } from './learned-view';
import { neverReason } from './verdict';
import { chanceOf, gainInput, priceAt, pricedGrade } from './verdict-inputs';
import type { Verdict, VerdictSubject } from './verdict-view';

export type VerdictInShort = Pick<Verdict, 'verdict' | 'gainCents' | 'askedCents'>;

/**
 * The word of a verdict with its gain and the asked price, for long lists: those of verdictOf() to the cent, without
 * what only a page about one part shows. In: as verdictOf(). Out: amounts in cents. Throws RangeError on an unknown
 * kind or cause.
 */
export function verdictInShort(
	subject: VerdictSubject,
	policy: ShopFigures,
	season: Season
): VerdictInShort {
	const chance = chanceOf(subject, policy);
	if (neverReason(subject, chance)) return { verdict: 'never', gainCents: null, askedCents: null };
	if (!subject.price) return { verdict: 'needs a price', gainCents: null, askedCents: null };
	const grade = pricedGrade(subject, chance.level);
	const { usedCents } = priceAt(grade, subject.price, policy);
	const gained = gainCents(gainInput(subject, policy, season, usedCents));
	const verdict = verdictWord({ gainCents: gained, marginCents: policy.marginCents });
	return { verdict, gainCents: gained, askedCents: usedCents };
}
