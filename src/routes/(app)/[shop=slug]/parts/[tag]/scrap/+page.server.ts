import { Scrap } from '$lib/parts/input';
import { scrapPart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', (ctx, event: PageServerLoadEvent) =>
	loadSheet(ctx, event, 'scrap')
);

export const actions = {
	default: action('work', Scrap, async (ctx, input, event: RequestEvent) => {
		const done = await scrapPart(ctx, event.params.tag, input);
		return after(event, done, input.destroyed ? 'Destroyed' : 'Scrapped');
	})
};
