import { Move } from '$lib/parts/input';
import { listBins } from '$lib/server/bins';
import { binsFor, movePart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'move');
	const { kind, massGrams, doubtful } = sheet.part;
	return { ...sheet, bins: doubtful ? await redBins(ctx) : await binsFor(ctx, kind, massGrams) };
});

const redBins = async (ctx: Parameters<typeof listBins>[0]) =>
	(await listBins(ctx))
		.filter(({ red }) => red)
		.map(({ address, place }) => ({ address, why: place || 'red bin' }));

export const actions = {
	default: action('work', Move, async (ctx, input, event: RequestEvent) => {
		const done = await movePart(ctx, event.params.tag, input);
		return after(event, done, `Moved to ${done.to}`);
	})
};
