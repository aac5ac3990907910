import { canPull } from '$lib/donors/state';
import { plural } from '$lib/format';
import { LogForm } from '$lib/parts/form';
import { minutesIn } from '$lib/parts/choices-form';
import { foundKinds, loggedSaid } from '$lib/parts/logging';
import { getDonor, todayIn } from '$lib/server/donors';
import { page } from '$lib/server/people';
import { chanceOn, countDonorParts, kindsStillOn, planFor, pullPart } from '$lib/server/parts';
import { actionWithPhotos } from '$lib/server/photos';
import { checklist, isCauseId, isKindId, kind, whyChance } from '$lib/trade';
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

type Ctx = Parameters<typeof chanceOn>[0];
type Donor = Awaited<ReturnType<typeof getDonor>>;

async function chosenKind(ctx: Ctx, id: string, donor: Donor) {
	const { name, system, howTested } = kind(id);
	const { chance, level, never } = await chanceOn(ctx, id, donor);
	const why = donor.cause && isCauseId(donor.cause) ? whyChance(id, donor.cause) : null;
	return {
		kind: id,
		kindName: name,
		system,
		howTested,
		chance,
		level,
		never,
		why,
		checklist: checklist(id)
	};
}

export const actions = {
	log: actionWithPhotos('work', LogForm, 'photo', async (ctx, input, kept, event: RequestEvent) => {
		const logged = await pullPart(ctx, event.params.donor, input, kept);
		const said = encodeURIComponent(loggedSaid(kind(input.kind).name, logged));
		const minutes = minutesIn(event.url.searchParams) ?? '';
		return { to: `${event.url.pathname}?minutes=${minutes}&done=${said}&undo=${logged.eventId}` };
	})
};
