import { BENCH_TESTS, IN_PLACE, type InPlaceTest, type TestField } from './bench-tests.data';
import { kind } from './kind';
import { mayCrank, type TriageAnswers } from './triage';

/** A shop's own bound of a field; what is left out is the usual one. */
export interface Limit {
	least?: number | undefined;
	most?: number | undefined;
}
export type Limits = Readonly<Record<string, Limit>>;

/**
 * The figures that the test of a kind reads, with the shop's own bounds over the usual ones; empty
 * where it reads none. Throws RangeError on an unknown kind. Common practice, no source.
 */
export function testFields(kindId: string, limits: Limits = {}): TestField[] {
	const fields = BENCH_TESTS[kind(kindId).id]?.fields ?? [];
	return fields.map((field) => {
		const { least = field.least, most = field.most } = limits[field.id] ?? {};
		const { id, said, unit } = field;
		return {
			...{ id, said, unit },
			...(least === undefined ? {} : { least }),
			...(most === undefined ? {} : { most })
		};
	});
}

/** Whether a kind is tested again when warm. */
export const testsHot = (kindId: string): boolean => BENCH_TESTS[kindId]?.hot ?? false;

export interface InPlaceNow extends InPlaceTest {
	kind: string;
	/** Why it must not be tried; null where it may. */
	shut: string | null;
}

const TURN_FIRST =
	'Turn the flywheel by hand first. It is cranked only when it turns free and even.';
const NEVER = 'Not on this engine: it must not be turned.';

/**
 * The electrical and driving things that are tried now, before the engine is opened. What has to
 * turn is shut unless it was turned free by hand. In: the kinds on the engine, what the minute at
 * the tailgate showed. Out: in the order of the kinds. Common practice, no source.
 */
export function testsInPlace(kindIds: readonly string[], answers: TriageAnswers): InPlaceNow[] {
	const free = mayCrank(answers);
	const why = answers.turn === undefined ? TURN_FIRST : NEVER;
	return kindIds.flatMap((id) => {
		const test = IN_PLACE[id];
		if (!test) return [];
		return [{ ...test, kind: id, shut: test.turns && !free ? why : null }];
	});
}
