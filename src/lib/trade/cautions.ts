/** What must be so before a donor may leave the wet corner, each with its caution. */
export const SAFE_TICKS = [
	{
		id: 'fuel',
		said: 'fuel out',
		caution:
			'Drain it outdoors or with the doors open, far from any flame, heater or grinder, into a closed metal can. Old fuel goes to the hazardous-waste depot. Open the cap slowly: the tank may be under pressure.'
	},
	{
		id: 'bowl',
		said: 'bowl dry',
		caution:
			'Drop the bowl or open its drain, and press the primer until nothing comes. A cup of fuel left in a carburetor is enough to light a shelf.'
	},
	{
		id: 'oil',
		said: 'oil out',
		caution:
			'Tip the engine both ways over the pan. Used oil goes into its own marked can, never together with fuel, solvent or coolant. Milky oil gets a can of its own.'
	},
	{
		id: 'battery',
		said: 'battery out',
		caution:
			'Take off the negative lead first. Tape the posts, keep it upright, and do not store it in the box. A swollen one goes outdoors at once.'
	},
	{
		id: 'blade',
		said: 'blade off',
		caution:
			'Plug lead off first. Hold the blade with a block of wood, not by hand, and bin it: it is not kept.'
	},
	{
		id: 'plug',
		said: 'plug in its hole, lead off',
		caution:
			'The plug keeps dirt out of the cylinder. Tie the lead away from it. Never crank over an open plug hole with fuel about.'
	},
	{
		id: 'openings',
		said: 'openings plugged',
		caution:
			'Intake, exhaust, breather and fuel line: a rag works in, a plug or tape keeps mice and grit out.'
	}
] as const;
export type SafeTick = (typeof SAFE_TICKS)[number]['id'];

/** Whether every tick is there, so that the donor is safe to store. */
export function isSafeToStore(ticks: readonly string[]): boolean {
	return SAFE_TICKS.every((tick) => ticks.includes(tick.id));
}
