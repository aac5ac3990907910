import { DEFAULT_POLICY, type Policy } from './policy';
import { centsTyped } from './typed-money';

export type FigureUnit =
	| 'per cent'
	| 'per cent a year'
	| 'money'
	| 'money an hour'
	| 'money a year'
	| 'minutes'
	| 'times the odds'
	| 'days'
	| 'tests'
	| 'parts out'
	| 'calls'
	| 'donors'
	| 'sales';

/** One figure of the policy as the page asks for it. */
export interface PolicyFigure {
	/** Where it stands in the policy. */
	path: readonly [keyof Policy, string?];
	label: string;
	unit: FigureUnit;
	hint?: string;
}

export interface FigureGroup {
	title: string;
	lead: string;
	figures: readonly PolicyFigure[];
}

const figure = (
	path: PolicyFigure['path'],
	label: string,
	unit: FigureUnit,
	hint?: string
): PolicyFigure => ({ path, label, unit, ...(hint ? { hint } : {}) });

export const FIGURE_GROUPS: readonly FigureGroup[] = [
	{
		title: 'What a used part asks',
		lead: 'Common practice of the trade; no source.',
		figures: [
			figure(['shares', 'clean used'], 'Clean used, of new', 'per cent'),
			figure(['shares', 'good used'], 'Good used, of new', 'per cent'),
			figure(['shares', 'usable'], 'Usable, of new', 'per cent'),
			figure(['shares', 'untested'], 'Untested, of new', 'per cent'),
			figure(['shares', 'core'], 'Core, of new', 'per cent'),
			figure(['copyCap'], 'At most this share of a copy', 'per cent'),
			figure(['stepLimitCents'], 'Small prices end at', 'money', 'Below it the small step counts'),
			figure(['stepLowCents'], 'Small step', 'money', 'Asked prices are rounded to it'),
			figure(['stepHighCents'], 'Large step', 'money', 'Above the limit'),
			figure(['leastCents'], 'Least price of the counter', 'money', 'Common practice: 10 to 15'),
			figure(['marginCents'], 'Margin from which it is a keep', 'money', 'Under it: a close call'),
			figure(['staleDays'], 'A price is old after', 'days'),
			figure(['ownJobShare'], 'Own job: worth of new', 'per cent')
		]
	},
	{
		title: 'What the work costs',
		lead: 'For teardown count the wage, not the posted rate.',
		figures: [
			figure(['labourHourCents', 'normal'], 'Labour, normally', 'money an hour'),
			figure(['labourHourCents', 'slow'], 'Labour, slow season', 'money an hour'),
			figure(['labourHourCents', 'rush'], 'Labour, rush', 'money an hour', 'The posted rate'),
			figure(['keepMinutes'], 'Look, photo and tag', 'minutes', 'For each part that is kept')
		]
	},
	{
		title: 'What waiting costs',
		lead: 'The shelf, the money in it, and what becomes unsellable.',
		figures: [
			figure(['shelfCents', 's'], 'Shelf, small part', 'money a year'),
			figure(['shelfCents', 'm'], 'Shelf, medium part', 'money a year'),
			figure(['shelfCents', 'l'], 'Shelf, large part', 'money a year'),
			figure(['shelfCents', 'xl'], 'Shelf, very large part', 'money a year'),
			figure(['moneyRate'], 'Money', 'per cent a year'),
			figure(['dyingRate'], 'Becomes unsellable', 'per cent a year'),
			figure(
				['dyingRateAgeing'],
				'Becomes unsellable, kinds that age',
				'per cent a year',
				'Rubber, diaphragms'
			),
			figure(['waitingChance'], 'A waiting customer takes it', 'per cent'),
			figure(
				['askedWorth'],
				'Searches in vain that would have been sales',
				'per cent',
				'From memory; no source'
			)
		]
	},
	{
		title: 'What stands in the yard',
		lead: 'A parked donor counts as stock of all that is still on it. Room and memory run out first.',
		figures: [
			figure(['parkedMost'], 'Parked at most', 'donors'),
			figure(['parkedReviewDays'], 'Looked at again after', 'days')
		]
	},
	{
		title: 'Whether it is good',
		lead: 'By what the cause of death left of it, then by how it was proved. From memory; no source.',
		figures: [
			figure(['chances', 'high'], 'Chance high', 'per cent'),
			figure(['chances', 'medium'], 'Chance medium', 'per cent'),
			figure(['chances', 'low'], 'Chance low', 'per cent'),
			figure(['chances', 'ruined'], 'Ruined, or failed its test', 'per cent'),
			figure(['proofOdds', 'look-over'], 'Look-over passed', 'times the odds'),
			figure(['proofOdds', 'seen running'], 'Seen running', 'times the odds'),
			figure(['proofOdds', 'worked in place'], 'Worked in place', 'times the odds'),
			figure(['proofOdds', 'bench test cold'], 'Bench test cold passed', 'times the odds'),
			figure(['proofOdds', 'bench test hot'], 'Bench test hot passed', 'times the odds')
		]
	},
	{
		title: 'How slowly it learns',
		lead: 'What each figure weighs against what this shop sees itself. The more, the slower it moves.',
		figures: [
			figure(['priors', 'chance'], 'A chance of being good', 'tests', 'Bench tests of the kind'),
			figure(['priors', 'comeBacks'], 'A share of come-backs', 'parts out', 'Fitted or sold'),
			figure(['priors', 'calls'], 'Calls a year', 'calls', 'Seen with one on the shelf'),
			figure(['priors', 'shareSales'], 'A share of new', 'sales', 'Of the grade')
		]
	}
];

export const FIGURES: readonly PolicyFigure[] = FIGURE_GROUPS.flatMap(({ figures }) => figures);

/** The field that asks for a figure. */
export const fieldOf = ({ path }: Pick<PolicyFigure, 'path'>): string =>
	path.filter(Boolean).join('-').replaceAll(' ', '-');

/** A figure as the policy holds it: cents, a share of 1, minutes. */
export function figureIn(
	policy: Policy,
	{ path: [key, part] }: Pick<PolicyFigure, 'path'>
): number {
	const value: unknown = policy[key];
	return Number(part === undefined ? value : (value as Record<string, number>)[part]);
}

export const isOwn = (policy: Policy, figure: PolicyFigure): boolean =>
	figureIn(policy, figure) !== figureIn(DEFAULT_POLICY, figure);

/** A figure of the policy as it is typed: per cent, amounts with decimals. */
export function figureTyped(value: number, unit: string, currency: string): string {
	if (unit.startsWith('per cent')) return String(Math.round(value * 1e5) / 1e3);
	return unit.startsWith('money') ? centsTyped(value, currency) : String(value);
}

/** What stands behind the field of a figure. */
export function unitSaid(unit: string, currency: string): string {
	return unit.replace('per cent', '%').replace('money', currency);
}
