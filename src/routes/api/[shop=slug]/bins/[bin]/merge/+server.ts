import { Merge } from '$lib/bins/input';
import { change } from '$lib/server/people';
import { mergeBins } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const POST = change('work', Merge, async (ctx, input, { params }: RequestEvent) => ({
	body: await mergeBins(ctx, params.bin, input)
}));
