import type { EngineClass, Fitting } from '$lib/trade';

/** What most engines of a class have: ticked to begin with, to be corrected on the ramp. */
export const USUAL_FITTINGS: Record<EngineClass, Fitting[]> = {
	WB: ['recoil'],
	GP: ['recoil'],
	R1: ['12 V start', 'charging'],
	R2: ['12 V start', 'charging', 'two cylinders'],
	SN: ['recoil', 'mains start'],
	GE: ['recoil'],
	SA: ['recoil'],
	TR: ['recoil'],
	PW: ['recoil']
};

export const FITTING_SAID: Record<Fitting, string> = {
	recoil: 'recoil (rope)',
	'12 V start': '12 V starter',
	'mains start': 'mains starter',
	charging: 'charging coil',
	'two cylinders': 'two cylinders'
};
