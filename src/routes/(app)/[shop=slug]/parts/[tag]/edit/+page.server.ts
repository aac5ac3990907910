import { EditForm } from '$lib/parts/form';
import { editPart } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', (ctx, event: PageServerLoadEvent) =>
	loadSheet(ctx, event, 'edit')
);

export const actions = {
	default: action('work', EditForm, async (ctx, input, event: RequestEvent) =>
		after(event, await editPart(ctx, event.params.tag, input), 'Saved')
	)
};
