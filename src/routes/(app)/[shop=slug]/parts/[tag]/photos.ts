import { PhotoRef } from '$lib/donors/input';
import { plural } from '$lib/format';
import { Nothing } from '$lib/parts/input';
import { PHOTO_NONE } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import { hangPhoto, putBackPartPhoto, removePartPhoto } from '$lib/server/parts';
import { action } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import type { RequestEvent } from './$types';

const back = ({ params }: RequestEvent, said: string, more = '') => ({
	to: `/${params.shop}/parts/${params.tag}?done=${encodeURIComponent(said)}${more}`
});

/** What can be done with the photos of a part. */
export const photoActions = {
	photos: actionWithPhotos(
		'work',
		Nothing,
		'file',
		async (ctx, _input, kept, event: RequestEvent) => {
			if (kept.length === 0) throw new Refused('bad input', PHOTO_NONE, 'file');
			for (const photo of kept) await hangPhoto(ctx, event.params.tag, photo);
			return back(event, plural(kept.length, 'photo added', 'photos added'));
		}
	),
	removePhoto: action('work', PhotoRef, async (ctx, { id }, event: RequestEvent) => {
		await removePartPhoto(ctx, event.params.tag, id);
		return back(event, 'Photo taken away', `&removed=${id}`);
	}),
	putBackPhoto: action('work', PhotoRef, async (ctx, { id }, event: RequestEvent) => {
		await putBackPartPhoto(ctx, event.params.tag, id);
		return back(event, 'Photo is back');
	})
};
