import { CAUSES, LEVEL_LETTERS } from './causes.data';
import { kind } from './kind';

export type CauseId = (typeof CAUSES)[number]['id'];
export type Level = 'high' | 'medium' | 'low' | 'ruined';

const LEVELS: readonly Level[] = ['high', 'medium', 'low', 'ruined'];
const LETTERS = 'HMLX';

/** Whether this is the id of a cause of death. */
export function isCauseId(id: string): id is CauseId {
	return CAUSES.some((cause) => cause.id === id);
}

/** The cause in words, such as "ran without oil, seized". */
export function causeSaid(id: CauseId): string {
	return CAUSES.find((cause) => cause.id === id)?.said ?? id;
}

/**
 * What a cause of death leaves of a kind, before any test: probably fine, suspect, likely ruined or
 * ruined. A never-reuse kind that nobody keeps counts as ruined. Throws RangeError on another id.
 * Common practice, no source.
 */
export function chanceLevel(kindId: string, causeId: CauseId): Level {
	const letters = LEVEL_LETTERS[kind(kindId).id];
	const column = CAUSES.findIndex((cause) => cause.id === causeId);
	if (column < 0) throw new RangeError(`no such cause: ${causeId}`);
	return LEVELS[LETTERS.indexOf(letters?.charAt(column) || 'X')] ?? 'ruined';
}

/** The worse of two levels. */
export function worseLevel(a: Level, b: Level): Level {
	return LEVELS.indexOf(a) > LEVELS.indexOf(b) ? a : b;
}
