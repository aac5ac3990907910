import { PhotoRef, ShotInput } from '$lib/donors/input';
import { PHOTO_NONE } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import { addKeptPhoto, putBackDonorPhoto, removeDonorPhoto } from '$lib/server/donors';
import { action } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import type { RequestEvent } from './$types';
import { back } from './moves';

export const photos = {
	photos: actionWithPhotos(
		'work',
		ShotInput,
		'file',
		async (ctx, { shot }, kept, event: RequestEvent) => {
			if (kept.length === 0) throw new Refused('bad input', PHOTO_NONE, 'file');
			for (const one of kept) await addKeptPhoto(ctx, event.params.donor, one, shot);
			return back(event, kept.length === 1 ? 'Photo added' : `${kept.length} photos added`);
		}
	),
	removePhoto: action('work', PhotoRef, async (ctx, { id }, event: RequestEvent) => {
		await removeDonorPhoto(ctx, event.params.donor, id);
		return back(event, 'Photo taken away', `&removed=${id}`);
	}),
	putBackPhoto: action('work', PhotoRef, async (ctx, { id }, event: RequestEvent) => {
		await putBackDonorPhoto(ctx, event.params.donor, id);
		return back(event, 'Photo is back');
	})
};
