import { action, page } from '$lib/server/people';
import { lettersAbout, sendAgain } from '$lib/server/customers';
import * as wants from '$lib/server/wants';
import { EventRef, LetterRef, MatchRef, Nothing, TellInput, YesInput } from '$lib/wants/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('trade', async (ctx, { params, url }: PageServerLoadEvent) => {
	const want = await wants.getWant(ctx, params.want);
	return {
		want,
		draft: await wants.draftFor(ctx, params.want),
		letters: await lettersAbout(ctx, 'want', [want.id]),
		did: Number(url.searchParams.get('did')) || null,
		back: { href: `/${params.shop}/wants`, label: 'Wants' },
		short: `W${want.number}`
	};
});

/** Back to the want, with what was done and what can be undone. */
const after = ({ url }: RequestEvent, said: string, { eventId }: { eventId: number }) => ({
	to: `${url.pathname}?done=${encodeURIComponent(said)}&did=${eventId}`
});

type Ctx = Parameters<typeof wants.seeWant>[0];
const simply =
	(verb: typeof wants.seeWant, said: string) =>
	async (ctx: Ctx, _input: unknown, event: RequestEvent) =>
		after(event, said, await verb(ctx, event.params.want));

export const actions = {
	tell: action('trade', TellInput, async (ctx, input, event: RequestEvent) => {
		const done = await wants.tellWant(ctx, event.params.want, input);
		return after(event, input.by === 'e-mail' ? 'The letter is on its way' : 'Noted as told', done);
	}),
	yes: action('trade', YesInput, async (ctx, input, event: RequestEvent) => {
		const done = await wants.sayYes(ctx, event.params.want, input);
		return after(event, input.part ? 'Said yes, and the part is held' : 'Said yes', done);
	}),
	no: action('trade', Nothing, simply(wants.sayNo, 'Said no')),
	close: action('trade', Nothing, simply(wants.closeWant, 'Closed: they have it')),
	takeOff: action('trade', Nothing, simply(wants.takeOffWant, 'Taken off the list')),
	waitOn: action('trade', Nothing, simply(wants.waitOn, 'Waits on')),
	seen: action('trade', Nothing, simply(wants.seeWant, 'Looked at')),
	drop: action('trade', MatchRef, async (ctx, { match }, event: RequestEvent) =>
		after(event, 'Not this one', await wants.dropMatch(ctx, event.params.want, match))
	),
	undo: action('trade', EventRef, async (ctx, { event: id }, event: RequestEvent) => {
		await wants.undoWant(ctx, event.params.want, id);
		return { to: `${event.url.pathname}?done=Undone` };
	}),
	again: action('trade', LetterRef, async (ctx, { letter }, event: RequestEvent) => {
		await sendAgain(ctx, letter);
		return { to: `${event.url.pathname}?done=The letter is on its way again` };
	})
};
