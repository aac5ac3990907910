import { AskReading, TakeLabel, UndoTake } from '$lib/donors/label-form';
import * as donors from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import type { PageServerLoadEvent, RequestEvent } from './$types';

const home = ({ params }: { params: { shop: string; donor: string } }) =>
	`/${params.shop}/donors/${params.donor}`;

export const load = page('see', async (ctx, event: PageServerLoadEvent) => {
	const { params, url } = event;
	const donor = await donors.getDonor(ctx, params.donor);
	const readings = await donors.listReadings(ctx, params.donor);
	const asked = Number(url.searchParams.get('photo'));
	const labels = donor.photos.filter((photo) => photo.shot === 'label');
	const usual = readings[0]?.photoId ?? labels.at(-1)?.id ?? donor.photos[0]?.id;
	const photo = donor.photos.find((one) => one.id === asked) ?? null;
	const chosen = photo ?? donor.photos.find((one) => one.id === usual) ?? null;
	return {
		donor,
		photo: chosen,
		reading: readings.find((one) => one.photoId === chosen?.id) ?? null,
		thisYear: Number((await donors.todayIn(ctx)).slice(0, 4)),
		back: { href: home(event), label: donor.number },
		short: `${donor.number} · ${donor.tag}`
	};
});

export const actions = {
	read: action('work', AskReading, async (ctx, { photo }, event: RequestEvent) => {
		await donors.askReading(ctx, event.params.donor, photo);
		return { to: `${home(event)}/label?photo=${photo}` };
	}),
	take: action('work', TakeLabel, async (ctx, input, event: RequestEvent) => {
		const { eventId, said } = await donors.takeLabel(ctx, event.params.donor, input);
		const done = encodeURIComponent(`Taken over from the plate: ${said}`);
		return { to: `${home(event)}?done=${done}&plate=${eventId}` };
	}),
	undo: action('work', UndoTake, async (ctx, { event: id }, event: RequestEvent) => {
		await donors.undoTakeLabel(ctx, event.params.donor, id);
		return { to: `${home(event)}?done=${encodeURIComponent('As it was before')}` };
	})
};
