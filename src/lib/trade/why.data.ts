import type { CauseId } from './causes';

export interface Reason {
	cause: CauseId;
	kinds: readonly string[];
	said: string;
}

// the cells that people get wrong; common practice, no source
export const REASONS: readonly Reason[] = [
	{
		cause: 'strike',
		kinds: ['flywheel'],
		said: 'A sheared key can crack the hub or widen the keyway even when the rim looks perfect.'
	},
	{
		cause: 'strike',
		kinds: ['crank', 'adapter'],
		said: 'The blade took the blow here. A bent shaft is not straightened and a hub may hide a crack.'
	},
	{
		cause: 'no-oil',
		kinds: ['starter12', 'recoil', 'drive'],
		said: 'Somebody pulled or cranked on a locked engine.'
	},
	{
		cause: 'water',
		kinds: ['starter12', 'recoil', 'drive'],
		said: 'Somebody pulled or cranked on an engine stuck with rust.'
	},
	{
		cause: 'overheated',
		kinds: ['coil', 'stator', 'trigger'],
		said: 'The heat may have cooked the insulation: test it hot.'
	},
	{
		cause: 'overheated',
		kinds: ['govgear', 'cam'],
		said: 'Plastic teeth craze in hot oil, and the next engine runs away.'
	},
	{
		cause: 'no-oil',
		kinds: ['govgear'],
		said: 'Plastic teeth craze without oil, and the next engine runs away.'
	},
	{
		cause: 'no-oil',
		kinds: ['crank'],
		said: 'Aluminium smeared on an iron journal can often be lifted: measure it before scrapping it.'
	},
	{
		cause: 'no-oil',
		kinds: ['lowoil'],
		said: 'It did not save the engine.'
	},
	{
		cause: 'thrown-rod',
		kinds: ['lowoil'],
		said: 'It did not save the engine.'
	},
	{
		cause: 'thrown-rod',
		kinds: ['cam', 'sump', 'tappet'],
		said: 'The loose rod hits it on its way out.'
	},
	{
		cause: 'overspeed',
		kinds: ['flywheel', 'screen'],
		said: 'Spun beyond what it was made for: it may burst later, at ordinary speed.'
	},
	{
		cause: 'overspeed',
		kinds: ['govgear', 'govspring', 'govarm', 'ctrl', 'airvane', 'carb-float', 'carb-diaph'],
		said: 'The engine ran away, and this may be the very part that let it.'
	},
	{
		cause: 'overspeed',
		kinds: ['rod', 'vspring'],
		said: 'Stretched beyond its limit: nothing shows until it lets go.'
	},
	{
		cause: 'overspeed',
		kinds: ['regulator', 'genhead', 'avr', 'panel', 'trigger', 'starter120'],
		said: 'Too much speed is too much voltage.'
	},
	{
		cause: 'dirt',
		kinds: ['airbox'],
		said: 'It may be the leak that let the dirt in.'
	},
	{
		cause: 'dirt',
		kinds: ['carb-float', 'carb-diaph'],
		said: 'Grit wears the throttle shaft on its way through.'
	},
	{
		cause: 'stale-fuel',
		kinds: ['carb-float', 'carb-diaph', 'carb-bowl', 'fuel-valve', 'fuel-pump', 'fuel-sol'],
		said: 'The fuel that stopped the engine gummed this first. Everything else on such a donor is good.'
	},
	{
		cause: 'retired',
		kinds: ['valves', 'cam', 'rod', 'vspring', 'tappet', 'piston'],
		said: 'It ran to the end, so it has all its hours on it: measure it.'
	},
	{
		cause: 'flood',
		kinds: [
			'coil',
			'stator',
			'starter12',
			'regulator',
			'keyswitch',
			'trigger',
			'lowoil',
			'solenoid'
		],
		said: 'Water in windings, switches and bearings does its harm later, even when rinsed at once.'
	},
	{
		cause: 'lean',
		kinds: ['carb-diaph', 'intake'],
		said: 'It may be what starved the engine: look for the leak before it starves the next.'
	},
	{
		cause: 'valve',
		kinds: ['head', 'rocker'],
		said: 'What the valve hit, or what let it drop, is in here.'
	}
];
