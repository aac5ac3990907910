import { read } from '$lib/server/people';
import { getScrapRun } from '$lib/server/yard';
import type { RequestEvent } from './$types';

export const GET = read('work', (ctx, { params }: RequestEvent) =>
	getScrapRun(ctx, Number(params.run))
);
