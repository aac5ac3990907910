/** Best first: a part of an earlier grade answers a call for a later one. */
export const GRADES = ['clean used', 'good used', 'usable', 'untested', 'core'] as const;
export type Grade = (typeof GRADES)[number];

export const GRADE_SAID: Record<Grade, string> = {
	'clean used': 'tested, could pass for new inside',
	'good used': 'works, looks used',
	usable: 'works, with a named fault',
	untested: 'nobody has proved it yet',
	core: 'for rebuilding only'
};

export const PART_STATES = [
	'pulled',
	'shelved',
	'held',
	'out',
	'back',
	'scrapped',
	'missing'
] as const;
export type PartState = (typeof PART_STATES)[number];

/** How a part was checked. */
export const PROOFS = [
	'look-over',
	'seen running',
	'worked in place',
	'bench test cold',
	'bench test hot'
] as const;
export type ProofWay = (typeof PROOFS)[number];
