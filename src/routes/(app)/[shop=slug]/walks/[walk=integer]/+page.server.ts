import { Answer, AtPlace, Here, Stop } from '$lib/walks/input';
import { OUTCOME_SAID } from '$lib/walks/words';
import { plural } from '$lib/format';
import { action, page } from '$lib/server/people';
import {
	allThere,
	answerStop,
	endWalk,
	putStrayRight,
	reopenWalk,
	takeBackAnswer
} from '$lib/server/walks';
import { z } from 'zod';
import type { PageServerLoadEvent, RequestEvent } from './$types';
import { idOf, on, scanned, walkAt } from './way';

export const load = page('see', async (ctx, { params, url }: PageServerLoadEvent) => {
	const id = Number(params.walk);
	const code = url.searchParams.get('code')?.trim();
	const walk = await walkAt(ctx, id, url.searchParams);
	return {
		walk,
		scanned: code && walk.at ? await scanned(ctx, id, walk.at.id, code) : null,
		/** What was just answered, and can be taken back. */
		last: url.searchParams.get('last'),
		said: url.searchParams.get('said'),
		back: { href: `/${params.shop}/walks`, label: 'Walks' }
	};
});

export const actions = {
	answer: action('work', Answer, async (ctx, input, event: RequestEvent) => {
		const { n, outcome, note } = await answerStop(ctx, idOf(event), input);
		return on(event, note ? `${OUTCOME_SAID[outcome]}, ${note}` : OUTCOME_SAID[outcome], n);
	}),
	all: action('work', AtPlace, async (ctx, input, event: RequestEvent) => {
		const { count } = await allThere(ctx, idOf(event), input);
		return on(event, plural(count, 'answer noted', 'answers noted'));
	}),
	here: action('work', Here, async (ctx, input, event: RequestEvent) => {
		const { tag, note, n } = await putStrayRight(ctx, idOf(event), input);
		return on(event, `${tag}: ${note}`, n);
	}),
	back: action('work', Stop, async (ctx, input, event: RequestEvent) => {
		await takeBackAnswer(ctx, idOf(event), input);
		return on(event, 'Undone');
	}),
	end: action('work', z.object({}), async (ctx, _input, event: RequestEvent) => {
		await endWalk(ctx, idOf(event));
		return { to: event.url.pathname };
	}),
	again: action('work', z.object({}), async (ctx, _input, event: RequestEvent) => {
		await reopenWalk(ctx, idOf(event));
		return { to: event.url.pathname };
	})
};
