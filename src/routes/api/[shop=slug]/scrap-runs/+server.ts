import { change, read } from '$lib/server/people';
import { addScrapRun, getScrapRun, listScrapRuns } from '$lib/server/yard';
import { ScrapRun } from '$lib/yard/input';

export const GET = read('work', (ctx, { url }) =>
	listScrapRuns(ctx, Number(url.searchParams.get('cursor')) || undefined)
);

export const POST = change('work', ScrapRun, async (ctx, input) => {
	const { number } = await addScrapRun(ctx, input);
	return { status: 201, body: await getScrapRun(ctx, number) };
});
