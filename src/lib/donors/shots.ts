import type { DonorShot } from './words';

/** The six views that say later what came in. */
export const WANTED_SHOTS = [
	'front',
	'back',
	'label',
	'pto',
	'carburetor side',
	'failure'
] as const;

export const SHOT_SAID: Record<DonorShot, string> = {
	front: 'front',
	back: 'back',
	label: 'label or plate',
	pto: 'PTO end',
	'carburetor side': 'carburetor side',
	failure: 'inside, or the failure',
	box: 'the box',
	part: 'a part',
	other: 'something else'
};

/** Which of the wanted views nobody has taken yet, in their order. */
export const missingShots = (taken: readonly DonorShot[]): DonorShot[] =>
	WANTED_SHOTS.filter((shot) => !taken.includes(shot));
