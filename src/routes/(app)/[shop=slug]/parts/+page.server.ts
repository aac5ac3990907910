import { readPageQuestion } from '$lib/find/input';
import { findParts } from '$lib/server/find';
import { page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('see', async (ctx, { url }: PageServerLoadEvent) => {
	const { query, view, columns } = readPageQuestion(url.searchParams);
	return { question: { ...query, view, columns }, found: await findParts(ctx, query), wide: true };
});
