import { Proof } from '$lib/parts/input';
import { provePart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { kind } from '$lib/trade';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'prove');
	return { ...sheet, howTested: kind(sheet.part.kind).howTested };
});

export const actions = {
	default: action('work', Proof, async (ctx, input, event: RequestEvent) => {
		const { tag } = await provePart(ctx, event.params.tag, input);
		return after(event, { tag }, input.passed ? 'Passed' : 'Failed: it goes to the red bin');
	})
};
