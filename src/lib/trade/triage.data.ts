import type { CauseId } from './causes';

interface Evidence {
	cause: CauseId;
	/** 3 proves it, 2 speaks for it, 1 allows it; below 0 it speaks against it. */
	weight: 3 | 2 | 1 | -1 | -2;
}

export interface Answer {
	id: string;
	said: string;
	speaks: readonly Evidence[];
}

export interface Question {
	id: 'plug' | 'oil' | 'turn' | 'thumb' | 'spark' | 'signs';
	asks: string;
	hint: string;
	/** Several may hold. */
	many: boolean;
	/** Only engines with oil of their own. */
	fourStroke: boolean;
	answers: readonly Answer[];
}

const speaks = (text: string): Evidence[] =>
	text
		.split(' ')
		.filter(Boolean)
		.map((one) => {
			const [cause, weight] = one.split(':');
			return { cause: cause as CauseId, weight: Number(weight) as Evidence['weight'] };
		});

const answer = (id: string, said: string, evidence = ''): Answer => ({
	id,
	said,
	speaks: speaks(evidence)
});

// The minute at the tailgate; common practice, no source. Weights are from memory.
export const TRIAGE: readonly Question[] = [
	{
		id: 'plug',
		asks: 'Plug out: how does it look?',
		hint: 'Plug lead off first, tied away from the plug.',
		many: false,
		fourStroke: false,
		answers: [
			answer('dry', 'dry, as it should be'),
			answer('oily', 'black and oily', 'worn:1 dirt:1'),
			answer('blistered', 'white, blistered', 'overheated:2 lean:2'),
			answer('bridged', 'gap bridged', 'electrical:1'),
			answer('washed', 'steamed clean', 'water:2 flood:1')
		]
	},
	{
		id: 'oil',
		asks: 'Dipstick: what does the oil say?',
		hint: 'Engine level. Rub it between two fingers and smell it.',
		many: false,
		fourStroke: true,
		answers: [
			answer('right', 'right level, clean', 'no-oil:-2'),
			answer('empty', 'empty', 'no-oil:2'),
			answer('over', 'over-full, smells of fuel', 'stale-fuel:2'),
			answer('milky', 'milky', 'water:2 flood:1'),
			answer('glitter', 'glitters', 'thrown-rod:1 dirt:1 no-oil:1'),
			answer('burnt', 'burnt', 'overheated:2 no-oil:1')
		]
	},
	{
		id: 'turn',
		asks: 'Turn the flywheel by hand, plug out',
		hint: 'Gently, a full turn. Where it stops, stop.',
		many: false,
		fourStroke: false,
		answers: [
			answer('free', 'free and even', 'no-oil:-2 water:-1 lean:-1 thrown-rod:-1'),
			answer('clunk', 'free with a clunk', 'thrown-rod:2'),
			answer('springy', 'springy stop', 'water:1 flood:1 stale-fuel:1'),
			answer('solid', 'solid', 'no-oil:2 water:2 lean:2'),
			answer('no-valves', 'free, no valve feel', 'thrown-rod:1 strike:1 valve:1')
		]
	},
	{
		id: 'thumb',
		asks: 'Thumb over the plug hole',
		hint: 'Many engines let compression go on purpose at low speed: weak is no proof, a leak-down test is.',
		many: false,
		fourStroke: false,
		answers: [
			answer('puff', 'a good puff', 'valve:-1 worn:-1 thrown-rod:-1'),
			answer('weak', 'weak', 'valve:1 worn:1 dirt:1 overheated:1'),
			answer('none', 'none', 'valve:2 thrown-rod:1 overheated:1')
		]
	},
	{
		id: 'spark',
		asks: 'Spark on a gapped tester',
		hint: 'Only while it still turns free: about 350 turns a minute and the kill lead off, else a good coil looks dead. Ground the lead and cover the plug hole: open and fuelled it is a torch.',
		many: false,
		fourStroke: false,
		answers: [
			answer('good', 'good spark', 'electrical:-1'),
			answer('none', 'no spark', 'electrical:2')
		]
	},
	{
		id: 'signs',
		asks: 'Look all round: what is there to see?',
		hint: 'Tick all that hold.',
		many: true,
		fourStroke: false,
		answers: [
			answer('hole', 'hole in the block, or pieces', 'thrown-rod:3'),
			answer('key', 'flywheel key stepped, hub fretted', 'strike:3'),
			answer('wobble', 'blade end of the shaft wobbles', 'strike:3'),
			answer('fins', 'cooling fins packed', 'overheated:2'),
			answer('tints', 'blue or yellow heat tints', 'overheated:2 no-oil:2'),
			answer('chalk', 'white-green corrosion or varnish in the bowl', 'stale-fuel:3'),
			answer('sour', 'sour smell of fuel', 'stale-fuel:2'),
			answer('grit', 'grey dust in the intake', 'dirt:2'),
			answer('smoked', 'oil in the exhaust, smoked', 'worn:2 dirt:1'),
			answer('pushrod', 'pushrod bent, valve stuck or dropped', 'valve:3'),
			answer('rust', 'rust line, sat outside', 'water:2'),
			answer('mud', 'mud line, silt in gaps', 'flood:3'),
			answer('melted', 'melted plastic, burnt paint', 'fire:3'),
			answer('holes', 'mounting holes polished or stretched', 'overspeed:2 broken-block:1'),
			answer('raced', 'governor parts broken or off', 'overspeed:2'),
			answer('cracked', 'crack at the feet or ears', 'broken-block:3'),
			answer('exhaust', 'piston scored, seen through the exhaust port', 'lean:3'),
			answer('dead', 'does not crank on a good battery', 'electrical:2'),
			answer('runs', 'it starts and runs', 'retired:3')
		]
	}
];

/** What proves a cause once the engine is open; common practice, no source. */
export const PROVED_BY: Readonly<Record<CauseId, string>> = {
	'no-oil':
		'blue rod cap and journal, aluminium smeared on the crankpin, dry dipstick, skirt scored all round',
	'thrown-rod':
		'pieces; a break at the big end with heat is oil, a break near the pin at top dead centre is overspeed',
	dirt: 'grey dull intake; the tracks start at the leak: filter base, or manifold gasket with a clean carburetor',
	overheated:
		'packed fins, yellow and blue tints, coked oil, a black track across the gasket, a warped head, a loose seat',
	strike: 'half-moon key stepped, hub fretted, shaft end runs out',
	water: 'grey emulsion, a rust line, springy and then solid',
	'stale-fuel':
		'green-white corrosion, brown varnish, sour smell, swollen rubber; pitted inside is junk',
	valve: 'leak at the exhaust, a nick in the margin, a rod bent, a guide walked up',
	'broken-block': 'crack at the feet or the ears of a cover',
	fire: 'melted plastics, soft springs, warped castings',
	flood:
		'silt in bearing gaps, a mud line; ask whether it ran when it went under; salt water is rinsed off at once',
	overspeed:
		'rod broken at its narrow part near the pin, mounting holes polished or stretched, cracked brackets',
	lean: 'exhaust side scored: lean or an air leak; scored all round: no oil in the fuel',
	retired: 'it starts',
	electrical: 'the tester: coil, switch or low-oil unit',
	worn: 'low leak-down, blue smoke, oil on the plug',
	unknown: ''
};
