import { percent } from '$lib/format';
import { kind, type Level } from '$lib/trade';
import { callsSeen, rateBetween, rateSaid, shareBetween, shareSeen } from './learned-said';
import type { Figure, Observed, Taught } from './learned-view';
import { GRADES } from './words';

/** A figure that the shop's history has moved, in words. */
export interface TaughtRow {
	/** The kind of part, or the grade. */
	of: string;
	figure: string;
	usual: string;
	now: string;
	between: string;
	seen: string;
	/** How far it was moved: a share of the greater of what it was and is. */
	moved: number;
}

const LEVELS: readonly Level[] = ['high', 'medium', 'low'];

const movedBy = ({ usual, mean }: Figure) =>
	usual === mean ? 0 : Math.abs(mean - usual) / Math.max(usual, mean);

const shareRow = (of: string, name: string, figure: Figure, done: string): TaughtRow => ({
	...{ of, figure: name },
	usual: percent(figure.usual, 'en-US', 1),
	now: percent(figure.mean, 'en-US', 1),
	between: shareBetween(figure),
	seen: shareSeen(figure, done),
	moved: movedBy(figure)
});

function callsRow(id: string, taught: Taught): TaughtRow {
	const figure = taught.calls(id, '', 'some');
	return {
		...{ of: kind(id).name, figure: 'Calls a year, ordinary engine' },
		usual: rateSaid(figure.usual),
		now: rateSaid(figure.mean),
		between: rateBetween(figure),
		seen: callsSeen(figure),
		moved: movedBy(figure)
	};
}

const ofKind = (id: string, taught: Taught): TaughtRow[] => [
	...LEVELS.map((level) =>
		shareRow(kind(id).name, `Good, chance ${level}`, taught.chance(id, level), 'tested')
	),
	shareRow(kind(id).name, 'Comes back', taught.comeBack(id), 'gone out'),
	callsRow(id, taught)
];

/** The figures that the history of a shop has moved, most moved first. */
export function taughtRows(observed: Observed, taught: Taught): TaughtRow[] {
	const { tests, outs, calls } = observed;
	const ids = new Set([...tests, ...outs, ...calls].map((row) => row.kind));
	const grades = GRADES.map((grade) =>
		shareRow(grade, 'Share of new', taught.share(grade), 'sold')
	);
	return [...grades, ...[...ids].flatMap((id) => ofKind(id, taught))]
		.filter(({ moved, usual, now }) => moved > 0 && usual !== now)
		.sort((a, b) => b.moved - a.moved);
}
