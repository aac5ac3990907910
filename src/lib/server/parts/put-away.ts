import { readTag } from '$lib/codes';
import type { PutAway, UndoParts } from '$lib/parts/input';
import type { PutAwayDone } from '$lib/parts/view';
import { NotFound, Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { movePart } from './move';
import { placeNamed } from './place';
import { partRow } from './row';
import { undoPart } from './undo';

/** What a verb refused, in its words; anything else is a fault and stops the whole. */
async function refusedWords(work: Promise<unknown>): Promise<string | null> {
	try {
		await work;
		return null;
	} catch (fault) {
		if (fault instanceof Refused || fault instanceof NotFound) return fault.message;
		throw fault;
	}
}

/** A tag as it is printed, so that one typed in two ways counts once. */
function asPrinted(typed: string): string {
	const reading = readTag(typed);
	return 'tag' in reading ? reading.tag : typed.trim();
}

/**
 * Puts parts into one place; those that may not go there are said, the others are put. Parts are locked in
 * the order of their tags, so that two hands with the same parts do not wait for each other in a circle.
 */
export const putAway = (ctx: Context, { parts, bin }: PutAway): Promise<PutAwayDone> =>
	inShop(ctx, async (tx, ctx) => {
		allow(ctx, 'work');
		const place = await placeNamed(tx, ctx, bin);
		const done: PutAwayDone = { to: place.said, put: [], there: [], refused: [] };
		for (const tag of [...new Set(parts.map(asPrinted))].sort()) {
			const said = await refusedWords(
				(async () => {
					const row = await partRow(tx, ctx, tag);
					const lies = row.binId === place.binId && row.boxId === place.boxId;
					if (lies && row.state === 'shelved') return done.there.push(row.tag);
					const { eventId } = await movePart(ctx, row.tag, { bin });
					return done.put.push({ tag: row.tag, eventId });
				})()
			);
			if (said) done.refused.push({ tag, said });
		}
		return done;
	});

/** Takes back what was just done with several parts, the last first; where something was done since, it stays. */
export const undoParts = (ctx: Context, { events }: UndoParts): Promise<{ undone: number }> =>
	inShop(ctx, async (_tx, ctx) => {
		allow(ctx, 'work');
		let undone = 0;
		for (const event of [...events].sort((a, b) => b - a))
			if ((await refusedWords(undoPart(ctx, event))) === null) undone += 1;
		if (undone === 0)
			throw new Refused('changed', 'Something else was done with these parts since. Look at each.');
		return { undone };
	});
