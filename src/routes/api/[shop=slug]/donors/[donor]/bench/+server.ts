import { PlanQuestion } from '$lib/parts/choices-form';
import { benchFor } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('work', (ctx, { params, url }: RequestEvent) => {
	const { minutes } = PlanQuestion.parse(Object.fromEntries(url.searchParams));
	return benchFor(ctx, params.donor, minutes ?? null);
});
