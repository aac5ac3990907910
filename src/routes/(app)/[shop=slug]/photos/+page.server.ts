import { plural } from '$lib/format';
import { PhotoOf } from '$lib/parts/photo-of';
import { PHOTO_NONE } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import { photographAny } from '$lib/server/parts';
import { page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', (_ctx, { params, url }: PageServerLoadEvent) => ({
	leaving: url.searchParams.has('leaving'),
	back: { href: `/${params.shop}/donors`, label: 'Donors' }
}));

export const actions = {
	default: actionWithPhotos(
		'work',
		PhotoOf,
		'file',
		async (ctx, input, kept, event: RequestEvent) => {
			if (kept.length === 0) throw new Refused('bad input', PHOTO_NONE, 'file');
			for (const one of kept) await photographAny(ctx, input, one);
			const said = `${plural(kept.length, 'photo', 'photos')} added to ${input.of}`;
			return { to: `${event.url.pathname}?done=${encodeURIComponent(said)}` };
		}
	)
};
