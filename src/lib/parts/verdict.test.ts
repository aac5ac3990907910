import { DEFAULT_POLICY, type Policy } from '$lib/people/policy';
import { gain } from '$lib/worth';
import type { CauseId } from '$lib/trade';
import { describe, expect, it } from 'vitest';
import { demoDonors } from '../../../fixtures/demo-donors';
import { demoParts, type DemoPart } from '../../../fixtures/demo-parts';
import type { Season } from '$lib/people/settings';
import { gainInput, isTested, priceAt } from './verdict-inputs';
import { verdictOf } from './verdict';
import type { VerdictSubject } from './verdict-view';

const PRICE = {
	newCents: 10000,
	copyCents: null,
	source: 'Counter book',
	seenOn: '2026-03-03',
	stale: false
};

const subject = (over: Partial<VerdictSubject> = {}): VerdictSubject => ({
	kind: 'coil',
	grade: 'untested',
	cause: 'thrown-rod',
	secondCause: null,
	sureness: 'seen',
	proofs: [],
	place: 1,
	have: 1,
	price: PRICE,
	massGrams: null,
	litres: null,
	bin: null,
	stillOn: false,
	family: 'some',
	waiting: false,
	...over
});

const verdict = (
	over: Partial<VerdictSubject> = {},
	policy: Policy = DEFAULT_POLICY,
	season: Season = 'normal'
) => verdictOf(subject(over), policy, season);

const demoSubject = (part: DemoPart): VerdictSubject => {
	const donor = demoDonors.find(({ number }) => number === part.donor)!;
	return subject({
		kind: part.kind,
		grade: part.grade,
		cause: donor.cause as CauseId,
		proofs: part.proof ? [{ how: part.proof, passed: true }] : [],
		price: { ...PRICE, newCents: part.newCents, copyCents: part.copyCents },
		massGrams: part.massGrams
	});
};

/*
 * How the counts below are meant: every part of the shop with place 1, whatever its state, off its donor
 * (nothing to spend now), at the grade its tag says, the minutes of its kind, its own weight. A passed
 * bench test leaves nothing to do; all others still wait for their test, the one that is never kept too.
 */
describe('the demo shop comes out as a mechanic would expect', () => {
	const counted = (season: Season) => {
		const words = demoParts.map(
			(part) => verdictOf(demoSubject(part), DEFAULT_POLICY, season).verdict
		);
		return ['keep', 'close call', 'let it go', 'never', 'needs a price'].map(
			(word) => words.filter((each) => each === word).length
		);
	};
	const waiting = demoParts.map(demoSubject).filter((part) => !isTested(part));
	const today = (season: Season) =>
		waiting.filter((part) => {
			const word = verdictOf(part, DEFAULT_POLICY, season);
			if (word.verdict !== 'never') return word.timing === 'now';
			const { usedCents } = priceAt(part.grade, part.price!, DEFAULT_POLICY);
			return gain(gainInput(part, DEFAULT_POLICY, season, usedCents)).timing === 'now';
		}).length;

	it.each([
		['slow', [37, 13, 9, 1, 0]],
		['normal', [32, 18, 9, 1, 0]],
		['rush', [32, 18, 9, 1, 0]]
	] as const)('season %s: keep, close call, let it go, never', (season, expected) => {
		expect(counted(season)).toEqual(expected);
	});

	it('47 wait for their test; when to do it follows the season', () => {
		expect(waiting).toHaveLength(47);
		expect([today('slow'), today('normal'), today('rush')]).toEqual([37, 1, 0]);
	});

	it('cheap carburetors with a copy go, flywheels of an overspeed engine never stay, the dear and good are kept', () => {
		const of = (oldId: string) =>
			verdictOf(
				demoSubject(demoParts.find((part) => part.oldId === oldId)!),
				DEFAULT_POLICY,
				'normal'
			).verdict;
		expect([of('P001'), of('P010'), of('P051')]).toEqual(['let it go', 'let it go', 'let it go']);
		expect(of('P050')).toBe('never');
		expect([of('P040'), of('P017'), of('P031'), of('P042')]).toEqual([
			'keep',
			'keep',
			'keep',
			'keep'
		]);
	});
});
