import { DonorFilter } from '$lib/donors/filter';
import { listDonors } from '$lib/server/donors';
import { page } from '$lib/server/people';
import type { PageServerLoadEvent } from './$types';

export const load = page('see', async (ctx, { url }: PageServerLoadEvent) => {
	const asked = Object.fromEntries([...url.searchParams].filter(([, value]) => value !== ''));
	const filter = DonorFilter.catch({}).parse(asked);
	return { ...(await listDonors(ctx, filter)), filter, wide: true };
});
