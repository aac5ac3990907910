import { action, page } from '$lib/server/people';
import { getScrapRun, takeBackScrapRun } from '$lib/server/yard';
import { TakeBackRun } from '$lib/yard/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => ({
	run: await getScrapRun(ctx, Number(params.run)),
	back: { href: `/${params.shop}/scrap`, label: 'Scrap runs' },
	short: `Run ${params.run}`
}));

export const actions = {
	default: action('work', TakeBackRun, async (ctx, input, { params }: RequestEvent) => {
		await takeBackScrapRun(ctx, Number(params.run), input);
		return {
			to: `/${params.shop}/scrap/${params.run}?done=Taken back. Its donors stand as stripped again`
		};
	})
};
