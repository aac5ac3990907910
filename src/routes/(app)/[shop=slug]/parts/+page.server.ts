import { readQuestion } from '$lib/find/input';
import { findParts } from '$lib/server/find';
import { page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('see', async (ctx, { url }: PageServerLoadEvent) => {
	const question = readQuestion(url.searchParams);
	const view = url.searchParams.get('view') === 'table' ? 'table' : '';
	return { question: { ...question, view }, found: await findParts(ctx, question), wide: true };
});
