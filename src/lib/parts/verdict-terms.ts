import { goodTerms, priceTerms } from './terms-price';
import { keepTerms, waitTerms } from './terms-wait';
import { gainTerms, workTerms } from './terms-work';
import type { Basis } from './verdict-basis';
import type { VerdictTerm } from './verdict-view';

/** The whole sum in words, each figure with where it comes from. */
export const verdictTerms = (basis: Basis): VerdictTerm[] => [
	...priceTerms(basis),
	...goodTerms(basis),
	...waitTerms(basis),
	...keepTerms(basis),
	...workTerms(basis),
	...gainTerms(basis)
];
