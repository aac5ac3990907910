import { todayIn } from '$lib/server/donors';
import { getShop, page } from '$lib/server/people';
import { actionWithPhotos } from '$lib/server/photos';
import { addScrapRun, listScrapRuns, readyForScrap } from '$lib/server/yard';
import { SCRAP_CLASSES } from '$lib/trade';
import { ScrapRun } from '$lib/yard/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';
import { loadsOf, RunForm } from './form';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => {
	const { items } = await listScrapRuns(ctx);
	return {
		ready: await readyForScrap(ctx),
		classes: SCRAP_CLASSES.map(({ id, said }) => ({ id, said })),
		buyers: [...new Set(items.map(({ buyer }) => buyer))],
		today: await todayIn(ctx),
		back: { href: `/${params.shop}/scrap`, label: 'Scrap runs' }
	};
});

export const actions = {
	default: actionWithPhotos(
		'work',
		RunForm,
		'file',
		async (ctx, { file: _, ...typed }, kept, { params }: RequestEvent) => {
			const { currency } = await getShop(ctx);
			const run = ScrapRun.parse({ ...typed, loads: loadsOf(typed, currency) });
			const { number } = await addScrapRun(ctx, run, kept[0]);
			return { to: `/${params.shop}/scrap/${number}?done=Scrap run written down` };
		}
	)
};
