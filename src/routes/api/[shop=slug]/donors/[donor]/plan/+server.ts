import { PlanQuestion } from '$lib/parts/choices-form';
import { planFor } from '$lib/server/parts';
import { read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('see', (ctx, { params, url }: RequestEvent) => {
	const { minutes } = PlanQuestion.parse(Object.fromEntries(url.searchParams));
	return planFor(ctx, params.donor, minutes ?? null);
});
