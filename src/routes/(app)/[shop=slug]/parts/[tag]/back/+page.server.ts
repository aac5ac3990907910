import { TakeBack } from '$lib/parts/input';
import { takeBackPart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('trade', (ctx, event: PageServerLoadEvent) =>
	loadSheet(ctx, event, 'take back')
);

export const actions = {
	default: action('trade', TakeBack, async (ctx, input, event: RequestEvent) => {
		const done = await takeBackPart(ctx, event.params.tag, input);
		return after(event, done, `Taken back. Put it in ${done.to}`);
	})
};
