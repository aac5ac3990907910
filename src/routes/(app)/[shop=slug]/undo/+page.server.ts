import { Undo } from '$lib/parts/form';
import { action, page } from '$lib/server/people';
import { undoChanges } from '$lib/server/parts';
import { undoBinChange } from '$lib/server/walks';

export const load = page('see', (_ctx, { params }) => ({
	back: { href: `/${params.shop}/parts`, label: 'Find' }
}));

export const actions = {
	default: action('work', Undo, async (ctx, { event, back }) => {
		const [only, ...others] = event;
		const ofBin = only !== undefined && others.length === 0 && (await undoBinChange(ctx, only));
		if (!ofBin) await undoChanges(ctx, event);
		return { to: `${back}${back.includes('?') ? '&' : '?'}done=Undone` };
	})
};
