import { RackForm } from '$lib/bins/input';
import { plural } from '$lib/format';
import { makeRack } from '$lib/server/bins';
import { action, page } from '$lib/server/people';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', (_ctx, { params }: PageServerLoadEvent) => ({
	back: { href: `/${params.shop}/bins`, label: 'Bins' }
}));

export const actions = {
	default: action('work', RackForm, async (ctx, input, { params }: RequestEvent) => {
		const { rack, made, there, eventId } = await makeRack(ctx, input);
		const stood = there > 0 ? `; ${there} stood there already` : '';
		const done = `Rack ${rack}: ${plural(made.length, 'bin', 'bins')} made${stood}`;
		return { to: `/${params.shop}/bins?done=${encodeURIComponent(done)}&undo=${eventId}` };
	})
};
