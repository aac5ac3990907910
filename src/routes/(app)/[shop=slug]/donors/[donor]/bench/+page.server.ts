import { answerSaid } from '$lib/parts/bench/answer';
import { BenchForm } from '$lib/parts/bench/form';
import { minutesIn } from '$lib/parts/choices-form';
import { Leave, Pull } from '$lib/parts/input';
import { foundKinds, loggedSaid } from '$lib/parts/logging';
import { benchFor, leaveKindOn, pullPart, takeKindUp } from '$lib/server/parts';
import { action, page } from '$lib/server/people';
import { kind } from '$lib/trade';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params, url }: PageServerLoadEvent) => {
	const view = await benchFor(ctx, params.donor, minutesIn(url.searchParams));
	const q = url.searchParams.get('q') ?? '';
	return {
		view,
		chosen: url.searchParams.get('kind'),
		q,
		found: q ? foundKinds(q) : [],
		back: { href: `/${params.shop}/donors/${view.number}`, label: `Donor ${view.number}` },
		short: view.number
	};
});

const again = ({ url }: RequestEvent, done: string, undo?: number) => {
	const minutes = minutesIn(url.searchParams) ?? '';
	const event = undo === undefined ? '' : `&undo=${undo}`;
	return { to: `${url.pathname}?minutes=${minutes}&done=${encodeURIComponent(done)}${event}` };
};

export const actions = {
	answer: action('work', BenchForm, async (ctx, answer, event: RequestEvent) => {
		const { name } = kind(answer.kind);
		if (answer.what === 'leave') {
			await leaveKindOn(ctx, event.params.donor, answer.kind);
			return again(event, `${name} ${answerSaid(answer)}`);
		}
		const logged = await pullPart(ctx, event.params.donor, Pull.parse(answer.body));
		return again(event, loggedSaid(name, logged), logged.eventId);
	}),
	takeUp: action('work', Leave, async (ctx, input, event: RequestEvent) => {
		await takeKindUp(ctx, event.params.donor, input.kind);
		return again(event, `${kind(input.kind).name} stands on the plan again`);
	})
};
