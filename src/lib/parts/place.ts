import { GRADES, type Grade, type PartState } from './words';

/** A part as far as the queue for the next call needs to know it. */
export interface Queued {
	id: number;
	kind: string;
	engineKey: string;
	numberKeys: readonly string[];
	grade: Grade;
	state: PartState;
	inRedBin: boolean;
	/** Milliseconds; the older goes first. */
	pulledAt: number;
}

/** The same kind, sharing a part number or the engine's maker and model. */
export function answersTheSame(one: Queued, other: Queued): boolean {
	if (one.kind !== other.kind) return false;
	if (one.engineKey !== '' && one.engineKey === other.engineKey) return true;
	return one.numberKeys.some((key) => other.numberKeys.includes(key));
}

/** Pulled or shelved and promised to nobody. */
export const stands = (part: Pick<Queued, 'state' | 'inRedBin'>) =>
	(part.state === 'pulled' || part.state === 'shelved') && !part.inRedBin;

type Standing = Pick<Queued, 'id' | 'grade' | 'pulledAt'>;

/** Equal or better grades first, at equal grade the older. */
export function goesBefore(other: Standing, part: Standing): boolean {
	const by = GRADES.indexOf(other.grade) - GRADES.indexOf(part.grade);
	if (by !== 0) return by < 0;
	return other.pulledAt - part.pulledAt === 0 ? other.id < part.id : other.pulledAt < part.pulledAt;
}

/**
 * Its place in the queue for the next call, 1 for the first, and how many of the same the shop has.
 * Equal or better grades go first, at equal grade the older; two pulled together take successive
 * places. A part that is still on its donor is asked about with the highest id and the latest time.
 */
export function placeOf(part: Queued, others: readonly Queued[]): { place: number; have: number } {
	const same = others.filter(
		(other) => other.id !== part.id && stands(other) && answersTheSame(part, other)
	);
	return {
		place: 1 + same.filter((other) => goesBefore(other, part)).length,
		have: same.length + (stands(part) ? 1 : 0)
	};
}
