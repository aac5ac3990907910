import { plannable } from '../../src/lib/parts/plan';
import type { VerdictSubject } from '../../src/lib/parts/verdict-view';
import { kindsOn, type CauseId, type EngineClass, type Fitting } from '../../src/lib/trade';
import { demoDonors } from '../../fixtures/demo-donors';
import { demoParts } from '../../fixtures/demo-parts';

const priceOf = (number: number, kind: string) => {
	const part = demoParts.find((each) => each.donor === number && each.kind === kind);
	if (!part) return null;
	const { newCents, copyCents } = part;
	return { newCents, copyCents, source: 'Counter book', seenOn: '2026-03-03', stale: false };
};

/** Every kind of a donor of the demo shop as it came in, priced where the shop has a price. */
export function subjectsOn(number: number): VerdictSubject[] {
	const { engineClass, fittings, cause } = demoDonors.find((each) => each.number === number)!;
	const there = kindsOn(engineClass as EngineClass, fittings as Fitting[]);
	const subjects = there.map(({ id }): VerdictSubject => ({
		kind: id,
		...{ grade: 'untested', cause: cause as CauseId, secondCause: null, sureness: 'seen' },
		...{ proofs: [], place: 1, have: 0, price: priceOf(number, id), massGrams: null },
		...{ litres: null, bin: null, stillOn: true, family: 'some', waiting: false }
	}));
	return plannable(subjects, engineClass as EngineClass);
}
