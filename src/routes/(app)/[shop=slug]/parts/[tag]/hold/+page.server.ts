import { date } from '$lib/format';
import { Hold } from '$lib/parts/input';
import { holdPart, recentFor } from '$lib/server/parts';
import { action, getShop, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('hold', async (ctx, event: PageServerLoadEvent) => ({
	...(await loadSheet(ctx, event, 'hold')),
	recent: await recentFor(ctx)
}));

export const actions = {
	default: action('hold', Hold, async (ctx, input, event: RequestEvent) => {
		const done = await holdPart(ctx, event.params.tag, input);
		const until = date(done.until, (await getShop(ctx)).timeZone);
		return after(event, done, `Held for ${input.for} until ${until}`);
	})
};
