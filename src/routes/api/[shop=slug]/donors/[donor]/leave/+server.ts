import { Leave } from '$lib/parts/input';
import { leaveKindOn } from '$lib/server/parts';
import { change } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const POST = change('work', Leave, async (ctx, { kind }, { params }: RequestEvent) => {
	await leaveKindOn(ctx, params.donor, kind);
	return { body: { kind } };
});
