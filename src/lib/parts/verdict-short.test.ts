import { kinds, CAUSES } from '$lib/trade';
import { DEFAULT_POLICY, FAMILY_FACTOR, type FamilyMark } from '$lib/people/policy';
import { SEASONS } from '$lib/people/settings';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { verdictOf } from './verdict';
import { verdictInShort } from './verdict-short';
import type { VerdictSubject } from './verdict-view';
import { GRADES, PROOFS } from './words';

const one = <T>(list: readonly T[]) => fc.constantFrom(...list);
const cause = one([null, ...CAUSES.map(({ id }) => id)]);
const cents = fc.integer({ min: 1, max: 60_000 });

const subjects: fc.Arbitrary<VerdictSubject> = fc.record({
	kind: one(kinds.map(({ id }) => id)),
	grade: one(GRADES),
	cause,
	secondCause: cause,
	sureness: one([null, 'seen', 'likely', 'told'] as const),
	proofs: fc.array(fc.record({ how: one(PROOFS), passed: fc.boolean() }), { maxLength: 3 }),
	place: fc.integer({ min: 1, max: 30 }),
	have: fc.integer({ min: 0, max: 30 }),
	price: fc.option(
		fc.record({
			newCents: cents,
			copyCents: fc.option(cents),
			source: fc.constant('list'),
			seenOn: fc.constant('2026-03-01'),
			stale: fc.boolean()
		})
	),
	massGrams: fc.option(fc.integer({ min: 1, max: 20_000 })),
	litres: fc.constant(null),
	bin: fc.constant(null),
	stillOn: fc.constant(false),
	family: one(Object.keys(FAMILY_FACTOR) as FamilyMark[]),
	waiting: fc.boolean()
});

it('says the word, the gain and the price of the whole verdict, to the cent', () => {
	fc.assert(
		fc.property(subjects, one(SEASONS), (subject, season) => {
			const { verdict, gainCents, askedCents } = verdictOf(subject, DEFAULT_POLICY, season);
			expect(verdictInShort(subject, DEFAULT_POLICY, season)).toEqual({
				verdict,
				gainCents,
				askedCents
			});
		}),
		{ numRuns: 300 }
	);
});
