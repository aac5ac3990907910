import { Leave } from '$lib/parts/input';
import { takeKindUp } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Leave, async (ctx, { kind }, { params }: RequestEvent) => {
	await takeKindUp(ctx, params.donor, kind);
	return { body: { kind } };
});
