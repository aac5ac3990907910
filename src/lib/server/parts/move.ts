import type { Move } from '$lib/parts/input';
import { whyNotShelf } from '$lib/parts/state';
import { Refused } from '$lib/refusal';
import { inShop, type Context } from '../context';
import { placeNamed } from './place';
import { changePart, factsOf, partFor, type Done } from './row';

/** Puts a part into a bin or a donor's box; one that failed or came back only into the red bin. */
export const movePart = (ctx: Context, tag: string, input: Move): Promise<Done & { to: string }> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'move');
		const place = await placeNamed(tx, ctx, input.bin);
		const no = place.red ? null : whyNotShelf(await factsOf(tx, ctx, row));
		if (no) throw new Refused(no.code, no.said, 'bin');
		if (place.red && row.state === 'held')
			throw new Refused('gate', `It is held for ${row.heldFor}. Free it first.`, 'bin');
		const state = row.state === 'held' ? 'held' : place.red ? 'back' : 'shelved';
		const set = { binId: place.binId, boxId: place.boxId, state } as const;
		return { ...(await changePart(tx, ctx, row, 'move', set, { to: place.said })), to: place.said };
	});
