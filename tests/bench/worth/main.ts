import { beatsAll, shareOfTold, table, type Goal } from './report';
import { ALL_THUMBS, compare, IS_TOLD, KNOWS_ALL, LEARNS, NOTHING, type Asked } from './results';
import { SCENARIOS } from './scenario';
import { searched } from './search';
import type { TruthName } from './truth';

export interface Options extends Asked {
	search: boolean;
	only?: string;
}

const RIGHT: TruthName = 'as the defaults say';
const WRONG: readonly TruthName[] = [
	'a third of the calls',
	'three times the calls',
	'calls and chances mixed'
];

const say = ({ said, met }: Goal) => console.log(`  ${met ? 'met   ' : 'MISSED'}  ${said}`);

/** Prints the tables and the goals; says how many goals were missed. */
export function main(options: Options): number {
	const { seeds, years, sellOff, search, only } = options;
	const scenarios = SCENARIOS.filter(({ name }) => !only || name === only);
	if (scenarios.length === 0)
		throw new Error(`--only: one of ${SCENARIOS.map(({ name }) => name).join(', ')}`);
	console.log(
		`Seeds ${seeds.join(' ')}; ${years} years of donors, then ${sellOff} of selling off, what is left is scrapped.`
	);
	console.log(
		'Money is discounted at 10 % a year and said as a level yearly sum; ± is a 95 % interval over seeds.'
	);
	console.log('A bench hour counts what is earned above keeping nothing.');
	// what starts wrong is run three times over, so on half of the seeds
	const fewer = { ...options, seeds: seeds.slice(0, Math.ceil(seeds.length / 2)) };
	const goals: Goal[] = [];
	const judge = (found: readonly Goal[]) => {
		found.forEach(say);
		goals.push(...found);
	};
	for (const scenario of scenarios) {
		console.log(`\n${scenario.name.toUpperCase()}, ${RIGHT}`);
		const ways = [LEARNS, ...ALL_THUMBS, IS_TOLD, KNOWS_ALL];
		const results = compare(ways, scenario, RIGHT, options);
		console.log(table(results).join('\n'));
		judge(
			beatsAll(
				results,
				ALL_THUMBS.map(([name]) => name)
			)
		);
		judge([shareOfTold(results, 'money', 0.97)]);
		for (const truth of WRONG) {
			console.log(`  ${truth}, from the fourth year on (${fewer.seeds.length} seeds):`);
			const found = compare([LEARNS, IS_TOLD, NOTHING], scenario, truth, fewer);
			judge([shareOfTold(found, 'later', 0.9)]);
		}
		if (search) console.log(`  ${searched(scenario, RIGHT, options)}`);
	}
	const missed = goals.filter(({ met }) => !met).length;
	console.log(`\n${goals.length} goals, ${missed} missed`);
	return missed;
}
