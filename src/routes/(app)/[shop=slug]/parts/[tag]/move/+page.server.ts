import { Move } from '$lib/parts/input';
import { binsFor, movePart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'move');
	return { ...sheet, bins: await binsFor(ctx, sheet.part.kind) };
});

export const actions = {
	default: action('work', Move, async (ctx, input, event: RequestEvent) => {
		const done = await movePart(ctx, event.params.tag, input);
		return after(event, done, `Moved to ${done.to}`);
	})
};
