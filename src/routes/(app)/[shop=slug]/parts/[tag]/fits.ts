import { FitNote, Replaced } from '$lib/parts/fits';
import { noteFit } from '$lib/server/parts';
import { action } from '$lib/server/people';
import { replaceNumber } from '$lib/server/prices';
import { after } from './sheet';
import type { RequestEvent } from './$types';

/** What was tried, and which number takes the place of which. */
export const fitActions = {
	tried: action('work', FitNote, async (ctx, input, event: RequestEvent) =>
		after(event, await noteFit(ctx, event.params.tag, input), 'Noted where it fits')
	),
	replaced: action('work', Replaced, async (ctx, input, event: RequestEvent) => {
		await replaceNumber(ctx, input);
		return after(event, { tag: event.params.tag }, 'New number noted');
	})
};
