import type { DonorShot } from '$lib/donors/words';
import { PHOTO_NONE } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import type { Context } from '$lib/server/context';
import { addKeptPhoto, putBackDonorPhoto, removeDonorPhoto } from '$lib/server/donors';
import type { KeptPhoto } from '$lib/server/photos';
import type { RequestEvent } from './$types';
import { back } from './moves';

export async function addPhotos(
	ctx: Context,
	{ shot }: { shot: DonorShot },
	kept: KeptPhoto[],
	event: RequestEvent
) {
	if (kept.length === 0) throw new Refused('bad input', PHOTO_NONE, 'file');
	for (const one of kept) await addKeptPhoto(ctx, event.params.donor, one, shot);
	return back(event, kept.length === 1 ? 'Photo added' : `${kept.length} photos added`);
}

export async function removePhoto(ctx: Context, { id }: { id: number }, event: RequestEvent) {
	await removeDonorPhoto(ctx, event.params.donor, id);
	return back(event, 'Photo taken away', `&removed=${id}`);
}

export async function putBackPhoto(ctx: Context, { id }: { id: number }, event: RequestEvent) {
	await putBackDonorPhoto(ctx, event.params.donor, id);
	return back(event, 'Photo is back');
}
