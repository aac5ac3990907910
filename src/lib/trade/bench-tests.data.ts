/** One figure that a test reads. The bounds are usual ones, for orientation: under the engine maker's. */
export interface TestField {
	id: string;
	said: string;
	unit: string;
	least?: number;
	most?: number;
}

export interface KindTest {
	fields: readonly TestField[];
	/** Passed cold it may still fail hot: it is tested again when warm. */
	hot?: boolean;
}

export interface InPlaceTest {
	how: string;
	unit: string;
	/** It has to turn for this. */
	turns: boolean;
}

type Bounds = [least?: number, most?: number];

const field = (id: string, said: string, unit: string, [least, most]: Bounds = []): TestField => ({
	id,
	said,
	unit,
	...(least === undefined ? {} : { least }),
	...(most === undefined ? {} : { most })
});

const none = undefined;
const insulation = field('insulation', 'Winding to case', 'Mohm', [1]);
const leakDown = field('leak-down', 'Leak-down', '%', [none, 30]);

// what each test reads and what is usual; common practice, no source
export const BENCH_TESTS: Readonly<Record<string, KindTest>> = {
	'carb-float': {
		fields: [
			field('hold', 'Inlet needle holds, upside down', 'psi', [1.5]),
			field('shaft', 'Throttle shaft play', 'in', [none, 0.01])
		]
	},
	'carb-diaph': {
		fields: [
			field('pop', 'Needle pops at', 'psi', [13, 35]),
			field('hold', 'Then holds', 'psi', [10])
		]
	},
	'fuel-tank': { fields: [field('air', 'Holds air', 'psi', [none, 1.5])] },
	'fuel-valve': { fields: [field('dry', 'Closed without a drip', 'min', [5])] },
	'fuel-pump': {
		fields: [
			field('hold', 'Valves hold', 's', [10]),
			field('pressure', 'Pressure, live', 'psi', [1])
		]
	},
	'fuel-sol': { fields: [field('pulls', 'Still pulls at', 'V', [none, 9])] },
	coil: {
		hot: true,
		fields: [
			field('spark', 'Jumps a gap of', 'mm'),
			field('primary', 'Primary', 'ohm'),
			field('secondary', 'Secondary', 'kohm')
		]
	},
	trigger: { hot: true, fields: [field('pickup', 'Pickup', 'ohm')] },
	boot: { fields: [field('resistance', 'Resistance of the cap', 'kohm')] },
	recoil: { fields: [field('pulls', 'Engages out of ten pulls', 'pulls', [10, 10])] },
	starter12: {
		hot: true,
		fields: [
			field('current', 'Free run, current', 'A'),
			field('speed', 'Free run, speed', 'rpm'),
			field('volts', 'Battery meanwhile', 'V')
		]
	},
	starter120: { fields: [insulation] },
	solenoid: {
		fields: [
			field('pulls', 'Clicks down to', 'V', [none, 9]),
			field('drop', 'Lost across it under load', 'V', [none, 0.2])
		]
	},
	stator: {
		hot: true,
		fields: [
			field('legs', 'Leg to leg', 'ohm'),
			field('output', 'Output on a turning flywheel', 'V AC')
		]
	},
	regulator: {
		hot: true,
		fields: [field('charge', 'Charging voltage', 'V'), field('ripple', 'AC let through', 'V AC')]
	},
	oilpump: { fields: [field('rotor', 'Rotor clearance', 'mm', [none, 0.2])] },
	sump: { fields: [field('bearing', 'Bearing over the shaft', 'in')] },
	head: { fields: [field('warp', 'Warp', 'in', [none, 0.004])] },
	valves: {
		fields: [field('margin', 'Margin', 'in', [0.031]), field('stem', 'Stem runs out', 'in')]
	},
	vspring: {
		fields: [
			field('length', 'Free length', 'in'),
			field('twin', 'Differs from its twin', '%', [none, 3])
		]
	},
	cam: { fields: [field('lobes', 'Lobes differ by', 'in', [none, 0.005])] },
	piston: {
		fields: [
			field('skirt', 'Skirt in the bore', 'in'),
			field('ring', 'Side gap of a new ring', 'in', [none, 0.006])
		]
	},
	cyl: { fields: [field('gap', 'End gap of a new ring', 'in')] },
	headbolt: { fields: [field('length', 'Longer than its twin', 'in')] },
	crank: {
		fields: [field('journal', 'Crankpin', 'in'), field('runout', 'PTO end runs out', 'in')]
	},
	block: {
		fields: [
			field('wear', 'Bore wear', 'in', [none, 0.003]),
			field('round', 'Out of round', 'in', [none, 0.0015]),
			leakDown
		]
	},
	shortblock: { fields: [leakDown] },
	eclutch: {
		hot: true,
		fields: [field('coil', 'Coil', 'ohm', [2, 5]), field('gap', 'Air gap', 'in')]
	},
	genhead: {
		hot: true,
		fields: [
			insulation,
			field('winding', 'Winding to winding', 'ohm'),
			field('output', 'Output under load', 'V'),
			field('cycles', 'Under load', 'Hz')
		]
	},
	avr: {
		hot: true,
		fields: [
			field('output', 'Output on a known head', 'V'),
			field('capacitor', 'Capacitor off its mark by', '%', [none, 10])
		]
	},
	panel: { fields: [insulation] },
	brushholder: { fields: [field('brush', 'Brush left', '%', [50])] },
	pwpump: { fields: [field('pressure', 'Pressure on the rig', 'psi')] },
	unloader: { fields: [field('bypass', 'Bypasses at', 'psi')] },
	sawclutch: { fields: [field('groove', 'Sprocket groove', 'mm', [none, 0.5])] },
	sawtank: { fields: [field('air', 'Holds air', 'psi', [none, 1.5])] },
	brake: { fields: [field('stop', 'Blade stops in', 's')] },
	spindle: { fields: [field('play', 'Play at the end', 'in')] },
	pulley: { fields: [field('runout', 'Runs out', 'in')] },
	ptoswitch: { fields: [field('contacts', 'Across closed contacts', 'ohm')] },
	keyswitch: { fields: [field('contacts', 'Across closed contacts', 'ohm')] },
	cclutch: { fields: [field('lining', 'Lining left', 'mm')] },
	wheel: { fields: [field('bore', 'Bore', 'in')] },
	cable: {
		fields: [field('overall', 'Overall length', 'in'), field('exposed', 'Exposed length', 'in')]
	}
};

const still = (how: string, unit = ''): InPlaceTest => ({ how, unit, turns: false });
const turning = (how: string, unit = ''): InPlaceTest => ({ how, unit, turns: true });

// the cheapest test there will ever be: before teardown, belt off, blade off, PTO out
export const IN_PLACE: Readonly<Record<string, InPlaceTest>> = {
	starter12: turning(
		'Crank it, plug out: it throws, spins evenly, lets go. Note the current.',
		'A'
	),
	starter120: turning(
		'Insulation test first (1 Mohm or more), then three seconds on a socket with earth-leakage protection.',
		'Mohm'
	),
	solenoid: still(
		'Clicks at 12 V and still at about 9 V; under 0.2 V lost across it under load.',
		'V'
	),
	coil: turning('Spark across a gapped tester at about 350 turns a minute, kill lead off.', 'mm'),
	trigger: turning(
		'Spark across a gapped tester at about 350 turns a minute, kill lead off.',
		'mm'
	),
	stator: turning('AC volts at its plug while it turns: legs equal, none to ground.', 'V AC'),
	regulator: turning('Battery voltage rises while it runs.', 'V'),
	eclutch: still('Pulls in crisply at 12 V; coil about 2 to 5 ohm, none to the case.', 'ohm'),
	'fuel-sol': still('12 V: a crisp click and full travel; still pulls at about 9 V.', 'V'),
	keyswitch: still('Every position with a meter; turns and springs back.', 'ohm'),
	ptoswitch: still('Every pair of contacts, both ways, with a meter.', 'ohm'),
	lowoil: still('Tip it: it grounds the kill lead only when its float is down.'),
	hourmeter: still('Counts on supply.'),
	hydro: turning('Drives up a kerb, hot and cold, without a whine.'),
	genhead: turning('Under load: voltage and frequency steady.', 'V'),
	avr: turning('Under load: voltage steady.', 'V'),
	panel: still('Breaker trips and resets, every socket grips.'),
	throttlebody: turning('Only on the running engine.')
};
