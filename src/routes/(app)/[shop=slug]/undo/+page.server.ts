import { Undo } from '$lib/parts/form';
import { action, page } from '$lib/server/people';
import { undoPart } from '$lib/server/parts';

export const load = page('see', (_ctx, { params }) => ({
	back: { href: `/${params.shop}/parts`, label: 'Find' }
}));

export const actions = {
	default: action('work', Undo, async (ctx, { event, back }) => {
		await undoPart(ctx, event);
		return { to: `${back}${back.includes('?') ? '&' : '?'}done=Undone` };
	})
};
