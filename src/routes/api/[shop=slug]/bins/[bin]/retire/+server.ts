import { Nothing } from '$lib/parts/input';
import { retireBin } from '$lib/server/bins';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Nothing, async (ctx, _input, { params }: RequestEvent) => ({
	body: await retireBin(ctx, params.bin)
}));
