import { Scrap } from '$lib/parts/input';
import { hangPhoto, scrapPart } from '$lib/server/parts';
import { page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import { kind } from '$lib/trade';
import { z } from 'zod';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'scrap');
	return { ...sheet, safety: kind(sheet.part.kind).reuse.startsWith('safety') };
});

const ScrapForm = Scrap.extend({ file: z.unknown().optional() });

export const actions = {
	default: actionWithPhotos(
		'work',
		ScrapForm,
		'file',
		async (ctx, { file: _, ...input }, kept, event: RequestEvent) => {
			for (const one of kept) await hangPhoto(ctx, event.params.tag, one);
			const done = await scrapPart(ctx, event.params.tag, input);
			return after(event, done, input.destroyed ? 'Destroyed' : 'Scrapped');
		}
	)
};
