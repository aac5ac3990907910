import { chanceLevel, type CauseId } from './causes';
import { kind } from './kind';
import { REASONS } from './why.data';

const FIRE =
	'Fire softens aluminium and takes the temper out of springs, even where nothing melted.';

/**
 * Why a kind is doubtful after a cause, in a sentence for the screen; null where the level speaks
 * for itself or the part is probably fine. Throws RangeError on an unknown id.
 */
export function whyChance(kindId: string, causeId: CauseId): string | null {
	if (kind(kindId).reuse === 'never' && kindId !== 'rod') return null;
	if (chanceLevel(kindId, causeId) === 'high') return null;
	const reason = REASONS.find((each) => each.cause === causeId && each.kinds.includes(kindId));
	return reason?.said ?? (causeId === 'fire' ? FIRE : null);
}
