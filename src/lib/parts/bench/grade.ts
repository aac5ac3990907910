import type { Level, Reuse } from '$lib/trade';
import type { BenchKind } from './view';
import { PROOFS, type Grade, type ProofWay } from '../words';

const IF_PASSED: Record<Level, Grade> = {
	high: 'clean used',
	medium: 'good used',
	low: 'usable',
	ruined: 'core'
};

/**
 * The grade that goes with how a part was checked: a look proves only what needs no test, a part that ran
 * or worked is good used, a passed bench test is as good as its donor's death left its kind.
 */
export function gradeBy(how: ProofWay | '', level: Level, reuse: Reuse): Grade {
	if (level === 'ruined') return 'core';
	if (how === '') return 'untested';
	if (how === 'look-over') return reuse === 'look-over' ? worked(level) : 'untested';
	return how.startsWith('bench test') ? IF_PASSED[level] : worked(level);
}

const worked = (level: Level): Grade => (level === 'low' ? 'usable' : 'good used');

/** The grade for every way of checking, so that the screen need not ask. */
export const gradesFor = (level: Level, reuse: Reuse): BenchKind['grades'] =>
	Object.fromEntries(
		(['', ...PROOFS] as const).map((how) => [how, gradeBy(how, level, reuse)])
	) as BenchKind['grades'];
