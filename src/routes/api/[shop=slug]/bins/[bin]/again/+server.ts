import { Nothing } from '$lib/parts/input';
import { getBin, useBinAgain } from '$lib/server/bins';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	const { address } = await useBinAgain(ctx, params.bin);
	return { body: await getBin(ctx, address) };
});
