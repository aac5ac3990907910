import { kinds, type EngineClass, type Fitting, type Kind } from './kind';

const NEEDS: Readonly<Record<string, Fitting>> = {
	recoil: 'recoil',
	'recoil-kit': 'recoil',
	cup: 'recoil',
	starter12: '12 V start',
	drive: '12 V start',
	solenoid: '12 V start',
	ringgear: '12 V start',
	keyswitch: '12 V start',
	battery: '12 V start',
	starter120: 'mains start',
	stator: 'charging',
	regulator: 'charging'
};

// saws and trimmers are always pulled by a rope, whatever was ticked
const ALWAYS_RECOIL: readonly EngineClass[] = ['SA', 'TR'];

function hasFitting(each: Kind, engineClass: EngineClass, fittings: readonly Fitting[]): boolean {
	const needed = NEEDS[each.id];
	if (!needed) return true;
	if (needed === 'recoil' && ALWAYS_RECOIL.includes(engineClass)) return true;
	return fittings.includes(needed);
}

function promise(each: Kind): number {
	if (each.reuse === 'never') return -1;
	return (each.callsPerYear * (each.newLowCents + each.newHighCents)) / 2;
}

/**
 * The kinds that an engine of this class with these fittings has, the ones most worth pulling first
 * (calls a year x middle of the new price), never-reuse kinds last. Recoil parts need the recoil
 * fitting; starter, drive, solenoid, ring gear, key switch and battery the 12 V start; stator and
 * regulator the charging; the mains starter the mains start. Two cylinders adds no kind, only a
 * second one of some.
 */
export function kindsOn(engineClass: EngineClass, fittings: readonly Fitting[]): Kind[] {
	return kinds
		.filter((each) => each.on.includes(engineClass) && hasFitting(each, engineClass, fittings))
		.sort((a, b) => promise(b) - promise(a));
}
