import { DonorEditForm } from '$lib/donors/form';
import {
	CauseForm,
	MoveInput,
	PhotoRef,
	ReleaseInput,
	SafeInput,
	ShotInput
} from '$lib/donors/input';
import { donorOptions } from '$lib/donors/options';
import * as donors from '$lib/server/donors';
import { firstPhotos } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import { donorWanted } from '$lib/server/wants';
import type { PageServerLoadEvent, RequestEvent } from './$types';
import { back, moved } from './moves';
import { addPhotos, putBackPhoto, removePhoto } from './photos';
import { plateOf } from './plate';
import { donorWorth } from './worth';

export const load = page('see', async (ctx, { params, url }: PageServerLoadEvent) => {
	const donor = await donors.getDonor(ctx, params.donor);
	return {
		donor,
		today: await donors.todayIn(ctx),
		makers: await donors.listMakers(ctx),
		plate: await plateOf(ctx, params.donor, url),
		...donorOptions,
		...(await donorWorth(ctx, donor, url)),
		wanted: await donorWanted(ctx, donor.id),
		partPhotos: await firstPhotos(
			ctx,
			donor.parts.map((part) => part.tag)
		),
		removed: url.searchParams.get('removed'),
		photosAway: await donors.removedDonorPhotos(ctx, params.donor),
		back: { href: `/${params.shop}/donors`, label: 'Donors' },
		short: `${donor.number} · ${donor.tag}`
	};
});

export const actions = {
	strip: action('work', MoveInput, moved(donors.stripDonor, 'On the bench')),
	park: action('work', MoveInput, moved(donors.parkDonor, 'Parked')),
	review: action('work', MoveInput, moved(donors.reviewDonor, 'Stays parked')),
	bringBack: action('work', MoveInput, moved(donors.bringBackDonor, 'It is back')),
	reopen: action('work', MoveInput, moved(donors.reopenDonor, 'Reopened')),
	photos: actionWithPhotos('work', ShotInput, 'file', addPhotos),
	removePhoto: action('work', PhotoRef, removePhoto),
	putBackPhoto: action('work', PhotoRef, putBackPhoto),
	cause: action('work', CauseForm, async (ctx, input, event: RequestEvent) => {
		await donors.editDonor(ctx, event.params.donor, input);
		return back(event, 'Cause of death saved');
	}),
	release: action('work', ReleaseInput, async (ctx, input, event: RequestEvent) => {
		await donors.releaseDonor(ctx, event.params.donor, input);
		return back(event, 'Release recorded');
	}),
	safe: action('work', SafeInput, async (ctx, input, event: RequestEvent) => {
		await donors.tickSafe(ctx, event.params.donor, input);
		return back(event, 'Ticks saved');
	}),
	edit: action('work', DonorEditForm, async (ctx, input, event: RequestEvent) => {
		await donors.editDonor(ctx, event.params.donor, input);
		return back(event, 'Saved');
	}),
	box: action('work', MoveInput, async (ctx, _input, event: RequestEvent) => {
		const { tag } = await donors.addBox(ctx, event.params.donor);
		return back(event, `Another box: ${tag}`);
	})
};
