import { Nothing } from '$lib/parts/input';
import { change } from '$lib/server/people';
import { getWalk, reopenWalk } from '$lib/server/walks';
import type { RequestEvent } from './$types';

export const POST = change('work', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	const { id } = await reopenWalk(ctx, Number(params.walk));
	return { body: await getWalk(ctx, id) };
});
