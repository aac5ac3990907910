import { TakeInForm } from '$lib/donors/form';
import { classOptions, fittingOptions } from '$lib/donors/options';
import { listMakers, takeIn } from '$lib/server/donors';
import { page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => ({
	makers: await listMakers(ctx),
	classOptions,
	fittingOptions,
	back: { href: `/${params.shop}/donors`, label: 'Donors' }
}));

export const actions = {
	default: actionWithPhotos(
		'work',
		TakeInForm,
		'photo',
		async (ctx, input, photos, { params }: RequestEvent) => {
			const { number, tag } = await takeIn(ctx, input, photos);
			const done = encodeURIComponent(`Taken in as ${number}, box ${tag}`);
			return { to: `/${params.shop}/donors/${number}?done=${done}` };
		}
	)
};
