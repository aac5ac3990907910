import { change } from '$lib/server/people';
import { getScrapRun, takeBackScrapRun } from '$lib/server/yard';
import { TakeBackRun } from '$lib/yard/input';
import type { RequestEvent } from './$types';

export const POST = change('work', TakeBackRun, async (ctx, input, { params }: RequestEvent) => {
	await takeBackScrapRun(ctx, Number(params.run), input);
	return { body: await getScrapRun(ctx, Number(params.run)) };
});
