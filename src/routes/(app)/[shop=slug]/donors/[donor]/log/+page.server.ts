import { canPull } from '$lib/donors/state';
import { plural } from '$lib/format';
import { LogForm } from '$lib/parts/form';
import { minutesIn } from '$lib/parts/choices-form';
import { foundKinds, loggedSaid } from '$lib/parts/logging';
import { getDonor, todayIn } from '$lib/server/donors';
import { page } from '$lib/server/people';
import { countDonorParts, kindsStillOn, planFor, pullPart } from '$lib/server/parts';
import { actionWithPhotos } from '$lib/server/photos';
import { donorWanted } from '$lib/server/wants';
import { isKindId, kind } from '$lib/trade';
import { chosenKind } from './chosen';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params, url }: PageServerLoadEvent) => {
	const donor = await getDonor(ctx, params.donor);
	const id = url.searchParams.get('kind') ?? '';
	const q = url.searchParams.get('q') ?? '';
	const count = await countDonorParts(ctx, donor.id);
	const kinds = isKindId(id) ? [] : await kindsStillOn(ctx, params.donor);
	const { number, engine, causeSaid } = donor;
	const minutes = minutesIn(url.searchParams);
	const plans = kinds.length > 0 && !q;
	return {
		donor: { number, engine, causeSaid },
		open: canPull(donor, donor.release, await todayIn(ctx)),
		wanted: isKindId(id) ? [] : await donorWanted(ctx, donor.id),
		logged: plural(count, 'part logged', 'parts logged'),
		kinds,
		minutes,
		plan: plans ? await planFor(ctx, number, minutes) : null,
		q,
		found: q ? foundKinds(q, kinds) : [],
		chosen: isKindId(id) ? await chosenKind(ctx, id, donor) : null,
		back: isKindId(id)
			? { href: `${url.pathname}?minutes=${minutes ?? ''}`, label: `${number}: kinds` }
			: { href: `/${params.shop}/donors/${number}`, label: `Donor ${number}` },
		short: number
	};
});

export const actions = {
	log: actionWithPhotos('work', LogForm, 'photo', async (ctx, input, kept, event: RequestEvent) => {
		const logged = await pullPart(ctx, event.params.donor, input, kept);
		const said = encodeURIComponent(loggedSaid(kind(input.kind).name, logged));
		const minutes = minutesIn(event.url.searchParams) ?? '';
		return { to: `${event.url.pathname}?minutes=${minutes}&done=${said}&undo=${logged.eventId}` };
	})
};
