import { LogForm } from '$lib/parts/form';
import { foundKinds, loggedSaid } from '$lib/parts/logging';
import { page } from '$lib/server/people';
import { binsFor, chanceOn, logOldStock, usualKinds } from '$lib/server/parts';
import { actionWithPhotos } from '$lib/server/photos';
import { checklist, isKindId, kind } from '$lib/trade';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params, url }: PageServerLoadEvent) => {
	const id = url.searchParams.get('kind') ?? '';
	const q = url.searchParams.get('q') ?? '';
	return {
		q,
		kinds: isKindId(id) ? [] : await usualKinds(ctx),
		found: q ? foundKinds(q) : [],
		chosen: isKindId(id) ? await chosenKind(ctx, id) : null,
		engine: url.searchParams.get('engine') ?? '',
		back: isKindId(id)
			? { href: url.pathname, label: 'Kinds' }
			: { href: `/${params.shop}/parts`, label: 'Find' }
	};
});

async function chosenKind(ctx: Parameters<typeof chanceOn>[0], id: string) {
	const { name, system, howTested } = kind(id);
	const { chance, level, never } = await chanceOn(ctx, id, null);
	return {
		kind: id,
		kindName: name,
		system,
		howTested,
		chance,
		level,
		never,
		why: null,
		bins: await binsFor(ctx, id),
		checklist: checklist(id)
	};
}

export const actions = {
	log: actionWithPhotos('work', LogForm, 'photo', async (ctx, input, kept, event: RequestEvent) => {
		const logged = await logOldStock(ctx, input, kept);
		const said = encodeURIComponent(loggedSaid(kind(input.kind).name, logged));
		return { to: `${event.url.pathname}?done=${said}&undo=${logged.eventId}` };
	})
};
