import type { PartState } from './words';

const STANDS: readonly PartState[] = ['pulled', 'shelved'];

/**
 * Whether a part comes in by this step: it can be had now and could not before, or it came back and can be had
 * once it is tested. Null: it was not logged before.
 */
export const comesIn = (from: PartState | null, to: PartState): boolean =>
	STANDS.includes(to) ? from === null || !STANDS.includes(from) : to === 'back' && from !== 'back';
