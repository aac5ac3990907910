import { Undo } from '$lib/parts/form';
import { action, page } from '$lib/server/people';
import { undoDonorMove } from '$lib/server/donors';
import { undoChanges } from '$lib/server/parts';
import { undoBinChange } from '$lib/server/walks';

export const load = page('see', (_ctx, { params }) => ({
	back: { href: `/${params.shop}/parts`, label: 'Find' }
}));

export const actions = {
	default: action('work', Undo, async (ctx, { event, back }) => {
		const [only, ...others] = event;
		const one = only !== undefined && others.length === 0;
		const done = one && ((await undoBinChange(ctx, only)) || (await undoDonorMove(ctx, only)));
		if (!done) await undoChanges(ctx, event);
		return { to: `${back}${back.includes('?') ? '&' : '?'}done=Undone` };
	})
};
