import {
	MeasureInput,
	PinChange,
	PinForm,
	PinRef,
	RulerInput,
	SeenForm,
	ShotChange
} from '$lib/parts/box/input';
import { canPull } from '$lib/donors/state';
import { SHOT_SAID } from '$lib/donors/shots';
import { changeShot, getDonor, todayIn } from '$lib/server/donors';
import * as parts from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { may } from '$lib/people/role';
import { boxKinds } from './kinds';
import { idOf, layRuler, logSeen, measured, shown } from './doing';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('see', async (ctx, { params }: PageServerLoadEvent) => {
	const photo = await parts.getPinnedPhoto(ctx, params.donor, Number(params.photo));
	const donor = await getDonor(ctx, params.donor);
	const works = may(ctx.role, 'work');
	return {
		photo,
		donor,
		kinds: works ? boxKinds(await parts.kindsStillOn(ctx, params.donor)) : [],
		open: canPull(donor, donor.release, await todayIn(ctx)),
		back: { href: `/${params.shop}/donors/${donor.number}`, label: `Donor ${donor.number}` },
		short: `${donor.number} · ${SHOT_SAID[photo.shot]}`,
		wide: true
	};
});

export const actions = {
	pin: action('work', PinForm, async (ctx, input, event: RequestEvent) => {
		const pin = { photo: idOf(event), ...input };
		const { n, eventId } = await parts.placePin(ctx, event.params.donor, pin);
		return shown(event, `Pin ${n} set`, [eventId]);
	}),
	change: action('work', PinChange, async (ctx, input, event: RequestEvent) => {
		const { n, eventId } = await parts.changePin(ctx, event.params.donor, input);
		return shown(event, `Pin ${n} ${input.what ? 'changed' : 'moved'}`, [eventId]);
	}),
	remove: action('work', PinRef, async (ctx, { pin }, event: RequestEvent) => {
		const { n, eventId } = await parts.removePin(ctx, event.params.donor, pin);
		return shown(event, `Pin ${n} taken away`, [eventId]);
	}),
	ruler: action('work', RulerInput, layRuler),
	measure: action('work', MeasureInput, measured),
	seen: action('work', SeenForm, logSeen),
	shot: action('work', ShotChange, async (ctx, { shot }, event: RequestEvent) => {
		await changeShot(ctx, event.params.donor, idOf(event), shot);
		return shown(event, `The photo shows ${SHOT_SAID[shot]}`);
	})
};
