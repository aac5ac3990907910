import { listCustomers } from '$lib/server/customers';
import { page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('trade', async (ctx, { url }: PageServerLoadEvent) => {
	const q = url.searchParams.get('q') ?? '';
	const after = Number(url.searchParams.get('after')) || undefined;
	return { q, ...(await listCustomers(ctx, { q, after })) };
});
