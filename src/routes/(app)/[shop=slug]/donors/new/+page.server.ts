import { TakeInForm } from '$lib/donors/form';
import { classOptions, fittingOptions } from '$lib/donors/options';
import { askReading, getDonor, listMakers, takeIn } from '$lib/server/donors';
import { page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import type { Context } from '$lib/server/context';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => ({
	makers: await listMakers(ctx),
	classOptions,
	fittingOptions,
	back: { href: `/${params.shop}/donors`, label: 'Donors' }
}));

/** While somebody walks on, the plate is read; what it says is offered on the donor's page. */
async function readPlate(ctx: Context, number: string): Promise<void> {
	const { photos } = await getDonor(ctx, number);
	const plate = photos.find((photo) => photo.shot === 'label');
	if (plate) await askReading(ctx, number, plate.id);
}

export const actions = {
	default: actionWithPhotos(
		'work',
		TakeInForm,
		'photo',
		async (ctx, input, photos, { params }: RequestEvent) => {
			const { number, tag } = await takeIn(ctx, input, photos);
			await readPlate(ctx, number);
			const done = encodeURIComponent(`Taken in as ${number}, box ${tag}`);
			return { to: `/${params.shop}/donors/${number}?done=${done}` };
		}
	)
};
