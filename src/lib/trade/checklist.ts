import { kind } from './kind';

export const DEFERRAL = "The engine maker's limits, your local code and a qualified person decide.";

const LISTS: Readonly<Record<string, readonly string[]>> = {
	flywheel: [
		'Clean, and looked at under strong light: hub, keyway corners and fin roots without a crack; dye where in doubt',
		'Key not sheared or spun, keyway edges sharp, taper bright and unmarked',
		'No fin missing or chipped, no hammer mark on the rim',
		'Magnets tight, ring gear teeth whole',
		'Not from an engine that ran too fast'
	],
	starter120: [
		'Insulation test between winding and case passed, figure written down',
		'Cord, plug and strain relief unhurt, earth wire continuous',
		'Three seconds of spin on a socket with earth-leakage protection'
	],
	genhead: [
		'Electronics unplugged, then the insulation test passed, figure written down',
		'Windings equal to each other or to a known good head',
		'Run under load: voltage and frequency steady'
	],
	panel: [
		'Electronics unplugged, then the insulation test passed',
		'Every socket grips, earth reaches every socket, the breaker trips and resets',
		'No scorch mark, no cracked cover'
	],
	govgear: [
		'Weights swing free, cup slides without a catch',
		'Plastic teeth whole, no fine cracks from heat',
		'Not from an engine that ran too fast or too hot'
	],
	govspring: [
		'Part number known, and the hole it sat in photographed',
		'Coils touch at rest, no longer than its twin',
		'Not from an engine that ran too fast'
	],
	airvane: [
		'Not bent or cracked, swings free on its pivot',
		'Spring and link with it, from the same engine',
		'Not from an engine that ran too fast'
	],
	brake: [
		'Lining even and thick enough, spring not stretched',
		'Switch opens and closes with the lever',
		"Stopping time measured on the machine with its blade, within the machine maker's time"
	],
	adapter: [
		'No crack at the ears or the hub, looked at under strong light',
		'Keyway sharp, bolt seat flat, bore not stretched',
		'Not from an engine whose blade struck something'
	],
	chainbrake: [
		'Snaps on at a push of the guard and stops the chain at once',
		'Band as thick as a new one all round, not blued',
		'Spring and guard without a crack'
	],
	ptoswitch: [
		'Every pair of contacts measured in both positions',
		'Returns by itself, nothing bridged or glued',
		'Plug and letters the same as on the one it replaces'
	],
	bail: [
		'Straight, returns by itself from every position',
		'No crack at the pivot or the bends',
		'Stops the engine on the machine it is fitted to'
	]
};

const WHERE = {
	'safety-own': 'Fitted in this shop only: not sold over the counter',
	'safety-trade': 'Fitted here, or given to a repair business: not sold over the counter'
} as const;

/**
 * What must be ticked before a safety kind may be kept, each line one tick, the last one saying who
 * decides in the end. Empty for kinds that need no checklist, and for never-reuse kinds, which no
 * checklist lets in. Throws RangeError on an unknown id.
 */
export function checklist(kindId: string): string[] {
	const { id, reuse } = kind(kindId);
	if (reuse !== 'safety-own' && reuse !== 'safety-trade') return [];
	return [...(LISTS[id] ?? []), WHERE[reuse], DEFERRAL];
}
