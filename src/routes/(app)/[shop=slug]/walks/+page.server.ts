import { StartWalk } from '$lib/walks/input';
import { action, page } from '$lib/server/people';
import { listWalks, startWalk, walkChoices } from '$lib/server/walks';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => ({
	...(await listWalks(ctx)),
	choices: await walkChoices(ctx),
	back: { href: `/${params.shop}/bins`, label: 'Bins' }
}));

export const actions = {
	start: action('work', StartWalk, async (ctx, input, { params }: RequestEvent) => {
		const { id } = await startWalk(ctx, input);
		return { to: `/${params.shop}/walks/${id}` };
	})
};
