import { findKind, isSafeToStore, SAFE_TICKS } from '../trade';

/** What whoever takes this part off its shelf must know. */
export function partCaution(part: {
	kind: string;
	grade: string;
	state: string;
	massGrams: number | null;
}): string {
	const reuse = findKind(part.kind)?.reuse;
	const heavy = part.massGrams !== null && part.massGrams >= 15_000;
	return [
		part.state === 'back' && 'Failed or came back: red bin',
		reuse === 'safety-own' && 'Safety part: fit in this shop only',
		reuse === 'safety-trade' && 'Safety part: fit here, or to a repair business',
		part.grade === 'untested' && part.state !== 'back' && 'Test before fitting',
		heavy && `Heavy, ${Math.round(part.massGrams! / 1000)} kg: keep low`
	]
		.filter(Boolean)
		.join('. ');
}

/** What must still be done to a donor before it may be stored, to be ticked off on the box by hand. */
export function boxCaution(state: string, safeTicks: readonly string[]): string {
	if (!['whole', 'on the bench'].includes(state) || isSafeToStore(safeTicks)) return '';
	const left = SAFE_TICKS.filter((tick) => !safeTicks.includes(tick.id));
	return `Not safe to store before: ${left.map((tick) => `☐ ${tick.said}`).join(' ')}`;
}

export const binCaution = (red: boolean): string =>
	red ? 'Red bin: nothing leaves it untested' : '';
