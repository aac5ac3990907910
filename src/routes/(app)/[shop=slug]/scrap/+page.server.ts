import { page } from '$lib/server/people';
import { listScrapRuns, listWaste, readyForScrap } from '$lib/server/yard';
import type { PageServerLoadEvent } from './$types';

export const load = page('work', async (ctx, { url }: PageServerLoadEvent) => {
	const cursor = Number(url.searchParams.get('cursor')) || undefined;
	return {
		...(await listScrapRuns(ctx, cursor)),
		ready: await readyForScrap(ctx),
		standing: (await listWaste(ctx)).standing
	};
});
